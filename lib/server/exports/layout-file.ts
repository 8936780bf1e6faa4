import { createHash } from 'node:crypto';
import {
  LAYOUT_FILE_FORMAT,
  LAYOUT_FILE_VERSION,
  layoutFileSchema,
  type LayoutFile,
} from '@/lib/contracts/layout-file';
import type { Snapshot } from '@/lib/contracts/revisions';
import { canonicalJson } from '@/lib/kinematics/canonical-json';
import { FloorPlan } from '@/models';
import { widthAtHand, pictureKey } from '../floor-plans/keys';
import { getObject, type StoredObject } from '../object-store';
import { armFileId, contentOfArm, withArms } from './file-arms';

export const sha256Of = (bytes: Uint8Array | string): string => createHash('sha256').update(bytes).digest('hex');

/** The checksum of a file: over everything in it but the checksum itself. */
export function layoutFileHash({ sha256: _, ...rest }: Record<string, unknown>): string {
  return sha256Of(canonicalJson(rest));
}

/** The file of a sheet. Two sheets with the same content give the same bytes, whoever exports them and wherever. */
export async function layoutFileOf(snapshot: Snapshot): Promise<LayoutFile> {
  const fileIds = new Map(snapshot.arms.map((arm) => [arm.id, armFileId(arm)]));
  const arms = new Map(snapshot.arms.map((arm) => [armFileId(arm), { id: armFileId(arm), ...contentOfArm(arm) }]));
  const file = layoutFileSchema.parse({
    format: LAYOUT_FILE_FORMAT,
    version: LAYOUT_FILE_VERSION,
    name: snapshot.name,
    mapSettings: snapshot.mapSettings,
    arms: [...arms.values()].sort((a, b) => (a.id < b.id ? -1 : 1)),
    floorPlan: await floorPlanOf(snapshot),
    items: withArms(snapshot.items, fileIds),
  });
  return { ...file, sha256: layoutFileHash(plain(file)) };
}

/** The largest stored picture of a floor plan, which is the whole one. */
export async function wholePicture(floorPlan: FloorPlan): Promise<StoredObject | null> {
  return getObject(pictureKey(floorPlan.objectPrefix, widthAtHand(floorPlan.pictureWidths, floorPlan.widthPx)));
}

async function floorPlanOf({ floorPlan }: Snapshot): Promise<unknown> {
  if (!floorPlan) return null;
  const row = await FloorPlan.findByPk(floorPlan.id);
  const picture = row && (await wholePicture(row));
  // A plan is kept while a revision shows it, so this is a fault of the store and not of the user.
  if (!picture) throw new Error(`The picture of floor plan ${floorPlan.id} is not in the object store`);
  const { name, widthPx, heightPx, calibration } = floorPlan;
  const { body, contentType: mediaType } = picture;
  const base64 = Buffer.from(body).toString('base64');
  return { name, widthPx, heightPx, calibration, picture: { mediaType, sha256: sha256Of(body), base64 } };
}

/** As JSON keeps it: without members that are undefined, and −0 as 0. */
export function plain(value: unknown): Record<string, unknown> {
  return JSON.parse(JSON.stringify(value)) as Record<string, unknown>;
}

/** Members in alphabetical order, an indent of one blank, a line feed at the end: one spelling for one file. */
export function layoutFileText(file: LayoutFile): string {
  return `${JSON.stringify(sorted(plain(file)), null, 1)}\n`;
}

function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, member]) => [key, sorted(member)]),
  );
}
