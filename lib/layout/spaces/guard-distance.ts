import { liesInside, segmentDistance, sidesOf } from '../clearance/plane';
import { itemToFloor, type PointMm } from '../geometry';
import type { Item } from '../items';
import type { Space } from './spaces';

/** How a space lies to a line on the floor, mm. */
export interface LineDistance {
  /** Least distance; 0 where they meet. */
  readonly distanceMm: number;
  /** How far the space reaches past the line; 0 where it does not. */
  readonly pastMm: number;
}

/**
 * A space against a line. Past a closed line is whatever lies outside of it; past an open one how far the space reaches beyond it
 * cannot be told, and only that it does.
 */
export function spaceToLine(space: readonly PointMm[], line: readonly PointMm[], closed: boolean): LineDistance {
  const sides = sidesOf(line, closed);
  const distanceMm = sidesOf(space, true).reduce(
    (least, [a, b]) => sides.reduce((near, [c, d]) => Math.min(near, segmentDistance(a, b, c, d)), least),
    Infinity,
  );
  if (!closed) return { distanceMm, pastMm: 0 };
  const outside = space.filter(([x, y]) => !liesInside(line, x, y));
  const pastMm = outside.reduce((most, point) => {
    const off = sides.reduce((near, [c, d]) => Math.min(near, segmentDistance(point, point, c, d)), Infinity);
    return Math.max(most, off);
  }, 0);
  return { distanceMm: outside.length === space.length ? 0 : distanceMm, pastMm };
}

export interface GuardRow extends LineDistance {
  readonly guardId: string;
  readonly guardName: string;
  readonly space: Space;
}

/** Every guard line against every space. */
export function guardRows(items: readonly Item[], spaces: readonly Space[]): GuardRow[] {
  return items.flatMap((item) => {
    if (item.kind !== 'guardLine' || item.hidden) return [];
    const line = item.pointsMm.map((point) => itemToFloor(item, point));
    return spaces.map((space) => ({
      guardId: item.id,
      guardName: item.name,
      space,
      ...spaceToLine(space.outlineMm, line, item.closed),
    }));
  });
}
