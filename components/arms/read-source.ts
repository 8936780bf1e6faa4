import type { Imported, ImportedArm } from '@/lib/layout/arm-import/imported-arm';
import { IMPORT_MAX_BYTES } from '@/lib/layout/arm-import/imported-arm';
import { readArmTable } from '@/lib/layout/arm-import/table';
import type { UrdfModel } from '@/lib/layout/arm-import/urdf-model';

export interface ChosenChain {
  readonly base: string;
  readonly tip: string;
}

/** A file that could be read; a URDF file may still leave open which of its links are meant. */
export interface ReadSource {
  readonly name: string;
  readonly arm: () => Imported<ImportedArm>;
  readonly chain: (ChosenChain & { readonly bases: readonly string[]; readonly tips: readonly TipChoice[] }) | null;
  readonly withChain: (chain: ChosenChain) => ReadSource;
}

export interface TipChoice {
  readonly link: string;
  readonly moving: number;
  readonly isEnd: boolean;
}

/** Tells a URDF file from a table by its first letter and reads it. The reader of XML is fetched when there is some. */
export async function readSource(text: string, name: string): Promise<Imported<ReadSource>> {
  if (
    !text
      .replace(/^\ufeff/, '')
      .trimStart()
      .startsWith('<')
  ) {
    const answer = readArmTable(text);
    if (!answer.ok) return answer;
    const source: ReadSource = { name, arm: () => answer, chain: null, withChain: () => source };
    return { ok: true, value: source };
  }
  const [file, arm, model] = await Promise.all([
    import('@/lib/layout/arm-import/urdf-file'),
    import('@/lib/layout/arm-import/urdf-arm'),
    import('@/lib/layout/arm-import/urdf-model'),
  ]);
  const answer = file.readUrdf(text);
  if (!answer.ok) return answer;
  const urdf = answer.value;
  const sourceOf = (chain: ChosenChain): ReadSource => ({
    name,
    arm: () => arm.armOfUrdf(urdf, chain.base, chain.tip),
    chain: { ...chain, bases: basesOf(urdf), tips: model.tipsOf(urdf, chain.base) },
    withChain: sourceOf,
  });
  const tip = model.tipsOf(urdf, urdf.root)[0]?.link ?? urdf.root;
  return { ok: true, value: sourceOf({ base: urdf.root, tip }) };
}

/** Links that something hangs on, the root first. */
function basesOf({ root, joints }: UrdfModel): string[] {
  return [root, ...new Set(joints.map(({ parent }) => parent).filter((parent) => parent !== root))];
}

/** The text of a file; spreadsheets also write UTF-16. Null above the limit. */
export async function textOfFile(file: File): Promise<string | null> {
  if (file.size > IMPORT_MAX_BYTES) return null;
  const bytes = new Uint8Array(await file.arrayBuffer());
  const isUtf16 = bytes[0] === 0xff && bytes[1] === 0xfe;
  return new TextDecoder(isUtf16 ? 'utf-16le' : 'utf-8').decode(bytes);
}
