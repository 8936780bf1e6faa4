import { sidesOf } from '../clearance/plane';
import { itemToFloor, polygonAreaMm2, type PointMm } from '../geometry';
import type { Item } from '../items';
import { walkwayEdges } from '../walkway-edges';
import { squareMm } from './standing-map';

/** Half the thickness that a guard line is taken with, mm: enough that nothing stands across it. */
const GUARD_HALF_MM = 5;

/**
 * The floor on which nothing may be put, as outlines of the floor frame: zones without bases, obstacles, fixtures, conveyors,
 * walkways, guard lines and the base plates of other robots.
 * @param moverId what is to be put somewhere, and is not in its own way.
 */
export function takenOutlines(items: readonly Item[], moverId: string, halfPlateMm: number): [number, number][][] {
  return items
    .filter(({ id, hidden }) => id !== moverId && !hidden)
    .flatMap((item) =>
      ownOutlines(item, halfPlateMm).map((outline) => outline.map((point) => itemToFloor(item, point))),
    )
    .filter((outline) => polygonAreaMm2(outline) > 0);
}

function ownOutlines(item: Item, halfPlateMm: number): (readonly PointMm[])[] {
  switch (item.kind) {
    case 'robot':
      return [squareMm(halfPlateMm)];
    case 'fixture':
    case 'obstacle':
      return [item.outlineMm];
    case 'zone':
      return item.use === 'keepOut' ? [item.outlineMm] : [];
    case 'conveyor':
    case 'walkway':
      return strips(item.pointsMm, item.widthMm / 2, false);
    case 'guardLine':
      return strips(item.pointsMm, GUARD_HALF_MM, item.closed);
    case 'protectiveDevice':
    case 'dimension':
    case 'sectionLine':
    case 'note':
      return [];
  }
}

/** One strip a side: a mitred outline may cross itself at a hairpin, and an outline here may not. */
function strips(points: readonly PointMm[], halfMm: number, closed: boolean): PointMm[][] {
  return sidesOf(points, closed)
    .filter(([from, to]) => Math.hypot(to[0] - from[0], to[1] - from[1]) > 0)
    .map(([from, to]) => {
      const [left, right] = walkwayEdges([from, to], 2 * halfMm);
      return [...left, ...right.reverse()];
    });
}
