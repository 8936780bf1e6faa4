import type { Item } from '@/lib/layout/items';
import type { Change } from '../changes';
import { aligned, distributed } from '../arrange';
import { copiedText, pasted, readCopied } from '../clipboard';
import { duplicated, edited, flagged, moved, removed, turnedBy } from '../edits';
import { grouped, ungrouped } from '../groups';
import { newBlock, newColumn, newDimension, newLine, newNote, newRobot, newSectionLine } from '../make-items';
import { reorder } from '../order';
import type { Sheet } from '../sheet';
import type { Seeded } from './seeded';

/** A new item of any kind somewhere on a bay of 9 by 6 m. */
export function randomItem(random: Seeded, sheet: Sheet): Item {
  const { items } = sheet.getState();
  const at = { id: random.id(), xMm: random.below(9000), yMm: random.below(6000) };
  const to: [number, number] = [random.below(9000), random.below(6000) + 7000];
  const corners: [number, number][] = [[at.xMm, at.yMm], to, [to[0] + 500, at.yMm]];
  switch (random.below(10)) {
    case 0:
      return newRobot(items, at, random.id());
    case 1:
      return newBlock(items, 'fixture', at);
    case 2:
      return newBlock(items, 'obstacle', at);
    case 3:
      return newLine(items, 'guardLine', at.id, corners, true);
    case 4:
      return newLine(items, 'walkway', at.id, corners, false);
    case 5:
      return newLine(items, 'conveyor', at.id, corners, false);
    case 6:
      return newColumn(items, at);
    case 7:
      return newNote(items, at);
    case 8:
      return newSectionLine(items, at.id, [at.xMm, at.yMm], to);
    default: {
      // Attached where there is something to attach to, so that removals and undos meet dimensions that follow.
      const item = items.size > 0 ? random.pick([...items.values()]) : undefined;
      const start = { atMm: [at.xMm, at.yMm] as const, item: item?.kind === 'dimension' ? undefined : item };
      return newDimension(items, at.id, start, to, random.below(500));
    }
  }
}

/** One edit as a planner might make it. Answers false where the draw came out as an edit that changes nothing. */
export function randomEdit(random: Seeded, sheet: Sheet): boolean {
  const { items, history } = sheet.getState();
  const steps = history.past.length;
  const ids = [...items.keys()];
  if (ids.length === 0 || random.chance(0.2)) {
    const item = randomItem(random, sheet);
    sheet.commit(`Place ${item.name}`, [{ itemId: item.id, before: null, after: item }]);
    return true;
  }
  const few = [...new Set(Array.from({ length: 1 + random.below(3) }, () => random.pick(ids)))];
  sheet.commit('Edit', changesOf(random, sheet, few));
  return sheet.getState().history.past.length > steps;
}

function changesOf(random: Seeded, sheet: Sheet, ids: string[]): readonly Change[] {
  const { items } = sheet.getState();
  const [first] = ids;
  switch (random.below(14)) {
    case 0:
      return removed(items, ids);
    case 1:
      return turnedBy(items, ids, random.below(360) - 180);
    case 2:
      return duplicated(items, ids, 200, random.id).changes;
    case 3:
      return reorder(items, first, random.chance(0.5) ? 1 : -1);
    case 4: {
      const item = items.get(first);
      const named = item && edited(item, { name: `Item ${random.below(1e6)}` });
      return named?.ok ? [{ itemId: first, before: item ?? null, after: named.value }] : [];
    }
    case 5:
      return grouped(items, ids, random.id());
    case 6:
      return ungrouped(items, ids);
    case 7:
      return aligned(items, ids, random.pick(['left', 'centre', 'right', 'far', 'middle', 'near']));
    case 8:
      return distributed(items, ids, random.pick(['across', 'away']));
    case 9:
      return flagged(items, ids, random.chance(0.5) ? { locked: random.chance(0.3) } : { hidden: random.chance(0.3) });
    case 10:
      return copiedAndPasted(random, sheet, ids);
    default:
      return moved(items, ids, random.below(2000) - 1000, random.below(2000) - 1000);
  }
}

/** Through the text of the clipboard, as from one sheet to another. */
function copiedAndPasted(random: Seeded, sheet: Sheet, ids: string[]): readonly Change[] {
  const { items } = sheet.getState();
  const chosen = ids.map((id) => items.get(id)).filter((item): item is Item => item !== undefined);
  const copied = readCopied(copiedText(chosen, 'here'));
  if (copied.kind !== 'items') throw new Error('What the sheet copies it can read.');
  const result = pasted(copied.items, { items, byMm: 250, knowsArm: () => true, newId: random.id });
  return result.ok ? result.changes : [];
}
