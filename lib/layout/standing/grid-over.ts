import { liesInside } from '../clearance/plane';
import { itemToFloor, type PointMm } from '../geometry';
import type { Item } from '../items';
import type { StandingQuestion } from './question';

/** The places that a study tries. */

export interface Box {
  readonly min: PointMm;
  readonly max: PointMm;
}

/** What lies within `reachMm` of every point, along x and along y. */
export function commonBox(points: readonly PointMm[], reachMm: number): Box {
  const [xs, ys] = [points.map(([x]) => x), points.map(([, y]) => y)];
  return {
    min: [Math.max(...xs) - reachMm, Math.max(...ys) - reachMm],
    max: [Math.min(...xs) + reachMm, Math.min(...ys) + reachMm],
  };
}

/** Inside the guard line that the mover stands in; the drawn place is one of the grid's places. */
export function gridOver(
  items: readonly Item[],
  reachable: Box,
  drawn: PointMm,
  stepMm: number,
): StandingQuestion['grid'] {
  const guard = guardBox(items, drawn);
  const axis = (k: 0 | 1) => {
    const low = Math.max(reachable.min[k], guard?.min[k] ?? -Infinity);
    const high = Math.min(reachable.max[k], guard?.max[k] ?? Infinity);
    // Points too far apart for any place leave one place, so that the answer can say so.
    if (!(high >= low)) return { from: drawn[k], count: 1 };
    const before = Math.max(0, Math.floor((drawn[k] - low) / stepMm));
    const after = Math.max(0, Math.floor((high - drawn[k]) / stepMm));
    return { from: drawn[k] - before * stepMm, count: before + after + 1 };
  };
  const [x, y] = [axis(0), axis(1)];
  return { originMm: [tidy(x.from), tidy(y.from)], stepMm, columns: x.count, rows: y.count };
}

export const tidy = (value: number): number => Math.round(value * 1e4) / 1e4;

function guardBox(items: readonly Item[], [x, y]: PointMm): Box | null {
  const around = items
    .filter((item) => item.kind === 'guardLine' && item.closed && !item.hidden)
    .map((item) => (item.kind === 'guardLine' ? item.pointsMm.map((point) => itemToFloor(item, point)) : []))
    .find((outline) => outline.length >= 3 && liesInside(outline, x, y));
  if (!around) return null;
  const [xs, ys] = [around.map(([px]) => px), around.map(([, py]) => py)];
  return { min: [Math.min(...xs), Math.min(...ys)], max: [Math.max(...xs), Math.max(...ys)] };
}
