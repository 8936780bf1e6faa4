import { z } from 'zod';
import { withFreshIds, withoutStrangers } from '@/lib/layout/fresh-ids';
import { itemSchema, type Item } from '@/lib/layout/items';
import type { Change, Items } from './changes';
import { freeName, kindWords } from './make-items';
import { lastPlace } from './order';

/**
 * What copying puts on the clipboard, as text, so that it travels between variants, projects and windows:
 *
 *   { "elbowroom": "items", "version": 1, "layoutId": "<where it was copied>", "items": [ <items as the sheet stores them> ] }
 *
 * `version` is raised when an older reader could no longer understand the items; fields that it does not know it leaves out.
 */
export const CLIPBOARD_VERSION = 1;
const MARK = 'items';
const MOST_ITEMS = 1000;
/** More than a full sheet of items; anything longer is not ours. */
const MOST_CHARACTERS = 8_000_000;

const envelopeSchema = z.object({ elbowroom: z.literal(MARK), version: z.number().int() });
const contentSchema = z.object({ layoutId: z.string(), items: z.array(itemSchema).min(1).max(MOST_ITEMS) });

export function copiedText(items: readonly Item[], layoutId: string): string {
  return JSON.stringify({ elbowroom: MARK, version: CLIPBOARD_VERSION, layoutId, items });
}

export type Copied =
  | { readonly kind: 'items'; readonly layoutId: string; readonly items: readonly Item[] }
  /** Ours, but it cannot be taken; the words say why. */
  | { readonly kind: 'refused'; readonly message: string }
  /** Somebody else's text: nothing to do with the sheet. */
  | { readonly kind: 'foreign' };

export function readCopied(text: string): Copied {
  if (text.length > MOST_CHARACTERS || !text.trimStart().startsWith('{')) return { kind: 'foreign' };
  let content: unknown;
  try {
    content = JSON.parse(text);
  } catch {
    return { kind: 'foreign' };
  }
  const envelope = envelopeSchema.safeParse(content);
  if (!envelope.success) return { kind: 'foreign' };
  if (envelope.data.version > CLIPBOARD_VERSION) {
    return {
      kind: 'refused',
      message: 'This was copied in a newer version of the sheet. Load this page again, then paste once more.',
    };
  }
  const checked = contentSchema.safeParse(content);
  if (!checked.success) {
    return {
      kind: 'refused',
      message: 'What was copied is damaged and cannot be placed. Copy it again from the sheet that it came from.',
    };
  }
  return { kind: 'items', ...checked.data };
}

export type Pasted =
  | { readonly ok: true; readonly changes: Change[]; readonly itemIds: string[] }
  | { readonly ok: false; readonly message: string };

export interface PasteTarget {
  readonly items: Items;
  /** How far beside the originals, mm; 0 where they come from another sheet and keep their place. */
  readonly byMm: number;
  readonly knowsArm: (armId: string) => boolean;
  readonly newId: () => string;
}

/** Copied items on a sheet: new ids, free names, nothing that points to what this sheet lacks. */
export function pasted(copied: readonly Item[], { items, byMm, knowsArm, newId }: PasteTarget): Pasted {
  const lacking = copied.find((item) => item.kind === 'robot' && !knowsArm(item.armId));
  if (lacking) {
    return { ok: false, message: `The library has no arm for ${lacking.name}. Add the arm on the page Arms first.` };
  }
  const ids = new Set<string>();
  for (const item of [...items.values(), ...copied]) {
    ids.add(item.id);
    if (item.kind === 'fixture') item.taskPoints.forEach(({ id }) => ids.add(id));
  }
  const now = new Map(items);
  const changes: Change[] = [];
  const known = copied.map((item) => withoutStrangers(item, (id) => ids.has(id)));
  for (const copy of withFreshIds(known, newId)) {
    const isTaken = [...now.values()].some(({ name }) => name === copy.name);
    const after: Item = {
      ...copy,
      name: isTaken ? freeName(now, copy.kind, kindWords(copy)) : copy.name,
      xMm: copy.xMm + byMm,
      yMm: copy.yMm - byMm,
      order: lastPlace(now),
      locked: false,
    };
    now.set(after.id, after);
    changes.push({ itemId: after.id, before: null, after });
  }
  return { ok: true, changes, itemIds: changes.map(({ itemId }) => itemId) };
}
