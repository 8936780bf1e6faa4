import { floorToItem, itemToFloor, type PointMm } from '@/lib/layout/geometry';
import type { Fixture, Item } from '@/lib/layout/items';
import { noteBoxMm } from '@/lib/layout/note-lines';
import type { FloorBounds } from '@/lib/layout/viewport';
import type { Items } from './changes';
import { inOrder } from './order';

/** Half the side of the square that a robot's base plate takes on the sheet, mm. */
const BASE_PLATE_HALF_MM = 200;

/** The points of the floor that an item is drawn through: its corners, or the points of its line. */
export function footprint(item: Item): [number, number][] {
  const local = localPoints(item);
  return local.map((point) => itemToFloor(item, point));
}

function localPoints(item: Item): readonly PointMm[] {
  switch (item.kind) {
    case 'robot': {
      const half = BASE_PLATE_HALF_MM;
      return [
        [-half, -half],
        [half, -half],
        [half, half],
        [-half, half],
      ];
    }
    case 'fixture':
    case 'obstacle':
    case 'zone':
      return item.outlineMm;
    case 'guardLine':
    case 'walkway':
    case 'conveyor':
    case 'protectiveDevice':
      return item.pointsMm;
    case 'note':
      return noteBoxMm(item);
    case 'dimension':
    case 'sectionLine':
      return [item.fromMm, item.toMm];
  }
}

export function liesInside(inner: FloorBounds, outer: FloorBounds): boolean {
  return (
    inner.minXMm >= outer.minXMm &&
    inner.minYMm >= outer.minYMm &&
    inner.maxXMm <= outer.maxXMm &&
    inner.maxYMm <= outer.maxYMm
  );
}

/** Whether a point lies inside an outline (even-odd rule); both in one frame. */
export function isInside(outline: readonly PointMm[], [x, y]: PointMm): boolean {
  let inside = false;
  for (let index = 0, last = outline.length - 1; index < outline.length; last = index, index += 1) {
    const [x1, y1] = outline[index];
    const [x2, y2] = outline[last];
    if (y1 > y !== y2 > y && x < ((x2 - x1) * (y - y1)) / (y2 - y1) + x1) inside = !inside;
  }
  return inside;
}

/** The topmost visible fixture over a spot of the floor, or the nearest one within `reachMm` of its place. */
export function fixtureAt(items: Items, spot: PointMm, reachMm = 0): Fixture | null {
  const fixtures = inOrder(items).filter((item): item is Fixture => item.kind === 'fixture' && !item.hidden);
  const over = fixtures.filter((fixture) => isInside(fixture.outlineMm, floorToItem(fixture, spot))).at(-1);
  if (over) return over;
  const distance = (fixture: Fixture) => Math.hypot(fixture.xMm - spot[0], fixture.yMm - spot[1]);
  const nearest = fixtures.sort((one, other) => distance(one) - distance(other))[0];
  return nearest && distance(nearest) <= reachMm ? nearest : null;
}
