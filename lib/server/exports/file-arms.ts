import { createHash } from 'node:crypto';
import type { LayoutFile } from '@/lib/contracts/layout-file';
import { canonicalJson } from '@/lib/kinematics/canonical-json';
import type { Item } from '@/lib/layout/items';

type FileArm = LayoutFile['arms'][number];
export type ArmOfFile = Omit<FileArm, 'id'>;

/** What an arm is, whatever library it stands in. */
export function contentOfArm({ name, description, payloadKg, definition }: ArmOfFile): ArmOfFile {
  return { name, description, payloadKg, definition };
}

/** A UUID (version 8 of RFC 9562: digits of our own choice) out of the SHA-256 of an arm's content. */
export function armFileId(arm: ArmOfFile): string {
  const hash = createHash('sha256')
    .update(canonicalJson(contentOfArm(arm)))
    .digest('hex');
  const variant = ((parseInt(hash[16], 16) & 0x3) | 0x8).toString(16);
  return `${hash.slice(0, 8)}-${hash.slice(8, 12)}-8${hash.slice(13, 16)}-${variant}${hash.slice(17, 20)}-${hash.slice(20, 32)}`;
}

/** The same items with other names for their arms; an arm that the table lacks stays. */
export function withArms(items: readonly Item[], armIds: ReadonlyMap<string, string>): Item[] {
  return items.map((item) =>
    item.kind === 'robot' ? { ...item, armId: armIds.get(item.armId) ?? item.armId } : { ...item },
  );
}
