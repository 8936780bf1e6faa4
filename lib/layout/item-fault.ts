import { distanceMm, outlineFault, type PointMm } from './geometry';
import { guardLengthMm } from './guard-doors';
import type { Door, GuardLine, Item } from './items';

/** Two marks nearer than this count as one spot, mm. */
const SAME_SPOT_MM = 1e-6;

const TOP_FAULT = 'The top must be above the bottom. Write a larger top or a smaller bottom.';

/** What is wrong with an item as a whole, where each of its fields is fine by itself; null where nothing is. */
export function itemFault(item: Item): string | null {
  if ('zToMm' in item && item.zToMm <= item.zFromMm) return TOP_FAULT;
  switch (item.kind) {
    case 'fixture':
    case 'obstacle':
    case 'zone':
      return outlineFault(item.outlineMm);
    case 'guardLine':
      return lineFault(item.pointsMm, item.closed);
    case 'walkway':
    case 'conveyor':
    case 'protectiveDevice':
      return lineFault(item.pointsMm, false);
    case 'dimension':
    case 'sectionLine':
      return distanceMm(item.fromMm, item.toMm) < SAME_SPOT_MM ? 'Both ends lie on one spot. Move one of them.' : null;
    case 'robot':
    case 'note':
      return null;
  }
}

/** Why points cannot be joined to a line: a side of no length has no direction. */
function lineFault(points: readonly PointMm[], closed: boolean): string | null {
  const sides = closed && points.length > 2 ? points.length : points.length - 1;
  for (let index = 0; index < sides; index += 1) {
    const next = (index + 1) % points.length;
    if (distanceMm(points[index], points[next]) < SAME_SPOT_MM) {
      return `Corners ${index + 1} and ${next + 1} lie on one spot. Remove one of them.`;
    }
  }
  return null;
}

/** Why a door has no place in its guard line; null where it has. */
export function doorFault(guard: GuardLine, door: Door): string | null {
  const lengthMm = Math.round(guardLengthMm(guard));
  if (door.alongMm + door.widthMm > lengthMm + 0.5) {
    return `The door ends beyond the line, which is ${lengthMm} mm long. Write a smaller distance or width.`;
  }
  const overlapped = guard.doors.find(
    (other) =>
      other.id !== door.id &&
      door.alongMm < other.alongMm + other.widthMm &&
      other.alongMm < door.alongMm + door.widthMm,
  );
  return overlapped ? `It would overlap ${overlapped.name}. Move one of the two.` : null;
}
