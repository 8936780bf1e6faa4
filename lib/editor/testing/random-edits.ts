import type { Item } from '@/lib/layout/items';
import type { Change } from '../changes';
import { duplicated, edited, moved, removed, turnedBy } from '../edits';
import { newBlock, newDimension, newLine, newRobot } from '../make-items';
import { reorder } from '../order';
import type { Sheet } from '../sheet';
import type { Seeded } from './seeded';

/** A new item of any kind somewhere on a bay of 9 by 6 m. */
export function randomItem(random: Seeded, sheet: Sheet): Item {
  const { items } = sheet.getState();
  const at = { id: random.id(), xMm: random.below(9000), yMm: random.below(6000) };
  const to: [number, number] = [random.below(9000), random.below(6000) + 7000];
  const corners: [number, number][] = [[at.xMm, at.yMm], to, [to[0] + 500, at.yMm]];
  switch (random.below(6)) {
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
    default:
      return newDimension(items, at.id, [at.xMm, at.yMm], to, random.below(500));
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
  switch (random.below(7)) {
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
    default:
      return moved(items, ids, random.below(2000) - 1000, random.below(2000) - 1000);
  }
}
