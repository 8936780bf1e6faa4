import type { Item } from '@/lib/layout/items';
import { boundsOfPoints, type FloorBounds } from '@/lib/layout/viewport';
import { put, type Change, type Items } from './changes';
import { footprint } from './footprint';
import { units } from './groups';
import { tidy } from './snapping';

export type Alignment = 'left' | 'centre' | 'right' | 'far' | 'middle' | 'near';
export type Direction = 'across' | 'away';

interface Unit {
  readonly items: readonly Item[];
  readonly bounds: FloorBounds;
  readonly locked: boolean;
}

function unitsOf(items: Items, ids: readonly string[]): Unit[] {
  const found = ids.map((id) => items.get(id)).filter((item): item is Item => item !== undefined);
  return units(found).flatMap((members) => {
    const bounds = boundsOfPoints(members.flatMap(footprint));
    return bounds ? [{ items: members, bounds, locked: members.some(({ locked }) => locked) }] : [];
  });
}

function shifted(items: Items, unit: Unit, byXMm: number, byYMm: number): Change[] {
  if (unit.locked || (byXMm === 0 && byYMm === 0)) return [];
  return unit.items.map((item) => put(items, { ...item, xMm: tidy(item.xMm + byXMm), yMm: tidy(item.yMm + byYMm) }));
}

const middle = (from: number, to: number): number => (from + to) / 2;

/**
 * Lines items up along an edge or the middle of what is chosen, judged by what they cover of the floor; a group moves as one.
 * Locked ones stay, and the others line up with them where there are any. `far` is the upper edge of the sheet.
 */
export function aligned(items: Items, ids: readonly string[], alignment: Alignment): Change[] {
  const all = unitsOf(items, ids);
  if (all.length < 2) return [];
  const held = all.filter(({ locked }) => locked);
  const frame = (held.length > 0 ? held : all).map(({ bounds }) => bounds);
  const minX = Math.min(...frame.map(({ minXMm }) => minXMm));
  const maxX = Math.max(...frame.map(({ maxXMm }) => maxXMm));
  const minY = Math.min(...frame.map(({ minYMm }) => minYMm));
  const maxY = Math.max(...frame.map(({ maxYMm }) => maxYMm));
  return all.flatMap((unit) => {
    const { minXMm, maxXMm, minYMm, maxYMm } = unit.bounds;
    switch (alignment) {
      case 'left':
        return shifted(items, unit, minX - minXMm, 0);
      case 'centre':
        return shifted(items, unit, middle(minX, maxX) - middle(minXMm, maxXMm), 0);
      case 'right':
        return shifted(items, unit, maxX - maxXMm, 0);
      case 'near':
        return shifted(items, unit, 0, minY - minYMm);
      case 'middle':
        return shifted(items, unit, 0, middle(minY, maxY) - middle(minYMm, maxYMm));
      case 'far':
        return shifted(items, unit, 0, maxY - maxYMm);
    }
  });
}

/** Makes the gaps between items equal; the two outermost stay, and so do locked ones. Needs three. */
export function distributed(items: Items, ids: readonly string[], direction: Direction): Change[] {
  const across = direction === 'across';
  const from = ({ bounds }: Unit) => (across ? bounds.minXMm : bounds.minYMm);
  const to = ({ bounds }: Unit) => (across ? bounds.maxXMm : bounds.maxYMm);
  const row = unitsOf(items, ids).sort((one, other) => middle(from(one), to(one)) - middle(from(other), to(other)));
  if (row.length < 3) return [];
  const taken = row.reduce((sum, unit) => sum + to(unit) - from(unit), 0);
  const gap = (to(row[row.length - 1]) - from(row[0]) - taken) / (row.length - 1);
  let edge = from(row[0]);
  return row.flatMap((unit) => {
    const by = edge - from(unit);
    edge += to(unit) - from(unit) + gap;
    return shifted(items, unit, across ? by : 0, across ? 0 : by);
  });
}
