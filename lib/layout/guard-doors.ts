import { distanceMm, signedAreaMm2, type PointMm } from './geometry';
import type { Door, GuardLine } from './items';

/** A door where it stands in its guard line, in the line's frame. */
export interface PlacedDoor {
  readonly door: Door;
  readonly fromMm: [number, number];
  readonly toMm: [number, number];
  /** Unit vector to the side that the leaf opens to; for a sliding door, along which its leaf runs beside the line. */
  readonly opensTo: [number, number];
}

type Guard = Pick<GuardLine, 'pointsMm' | 'closed' | 'doors'>;

function sidesOf({ pointsMm, closed }: Guard): [PointMm, PointMm][] {
  const count = pointsMm.length;
  const sides = Array.from({ length: closed ? count : count - 1 }, (_, index): [PointMm, PointMm] => [
    pointsMm[index],
    pointsMm[(index + 1) % count],
  ]);
  return sides.filter(([from, to]) => distanceMm(from, to) > 0);
}

export function guardLengthMm(guard: Guard): number {
  return sidesOf(guard).reduce((sum, [from, to]) => sum + distanceMm(from, to), 0);
}

/**
 * The doors of a guard line. A door stands on the side that its middle falls on and is pushed back onto that side where it would
 * run round a corner; on a side shorter than itself it takes the whole side.
 */
export function placedDoors(guard: Guard): PlacedDoor[] {
  const sides = sidesOf(guard);
  if (sides.length === 0) return [];
  const inward = guard.closed && signedAreaMm2(guard.pointsMm) < 0 ? -1 : 1;
  return guard.doors.map((door) => {
    const middle = door.alongMm + door.widthMm / 2;
    let start = 0;
    let index = 0;
    while (index < sides.length - 1 && start + distanceMm(...sides[index]) <= middle) {
      start += distanceMm(...sides[index]);
      index += 1;
    }
    const [from, to] = sides[index];
    const length = distanceMm(from, to);
    const width = Math.min(door.widthMm, length);
    const along = Math.min(Math.max(door.alongMm - start, 0), length - width);
    const [ux, uy] = [(to[0] - from[0]) / length, (to[1] - from[1]) / length];
    const at = (distance: number): [number, number] => [from[0] + ux * distance, from[1] + uy * distance];
    const side = door.kind === 'hinged-out' ? -inward : inward;
    return { door, fromMm: at(along), toMm: at(along + width), opensTo: [-uy * side, ux * side] };
  });
}

/** The guard line as strokes with its doors left open: what is fence and no leaf. */
export function fenceStrokes(guard: Guard): [PointMm, PointMm][] {
  const doors = placedDoors(guard);
  return sidesOf(guard).flatMap(([from, to]) => {
    const length = distanceMm(from, to);
    const [ux, uy] = [(to[0] - from[0]) / length, (to[1] - from[1]) / length];
    const along = ([x, y]: PointMm) => (x - from[0]) * ux + (y - from[1]) * uy;
    const off = ([x, y]: PointMm) => Math.abs((x - from[0]) * -uy + (y - from[1]) * ux);
    const isOn = (point: PointMm) => off(point) < 1e-3 && along(point) > -1e-3 && along(point) < length + 1e-3;
    const gaps = doors
      .filter(({ fromMm, toMm }) => isOn(fromMm) && isOn(toMm))
      .map(({ fromMm, toMm }) => [along(fromMm), along(toMm)] as const)
      .sort((one, other) => one[0] - other[0]);
    const strokes: [PointMm, PointMm][] = [];
    let reached = 0;
    const at = (distance: number): PointMm => [from[0] + ux * distance, from[1] + uy * distance];
    for (const [begin, end] of [...gaps, [length, length] as const]) {
      if (begin - reached > 1e-3) strokes.push([at(reached), at(begin)]);
      reached = Math.max(reached, end);
    }
    return strokes;
  });
}
