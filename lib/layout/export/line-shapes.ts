import { itemToFloor, type PointMm } from '../geometry';
import { fenceStrokes, placedDoors, type PlacedDoor } from '../guard-doors';
import type { GuardLine, ProtectiveDevice, Walkway } from '../items';
import { walkwayEdges } from '../walkway-edges';
import { detail, name, onFloor, uprightDeg, type Line, type Shape } from './shapes';

export function guardShapes(guard: GuardLine): Shape[] {
  const points = onFloor(guard, guard.pointsMm);
  const corner = points.reduce((best, point) => (point[1] - point[0] > best[1] - best[0] ? point : best));
  if (guard.doors.length === 0) {
    const { closed } = guard;
    const whole: Line = { kind: 'line', layer: 'GUARD-LINES', itemId: guard.id, points, closed, zMm: 0, part: 'body' };
    return [whole, name(guard, corner)];
  }
  return [
    ...fenceStrokes(guard).map((stroke) => ({ ...detail(guard, 'GUARD-LINES', stroke), part: 'body' as const })),
    ...placedDoors(guard).map((placed) => detail(guard, 'GUARD-LINES', doorPath(placed))),
    ...placedDoors(guard).map(({ door, fromMm, toMm }) => {
      const middle: PointMm = [(fromMm[0] + toMm[0]) / 2, (fromMm[1] + toMm[1]) / 2];
      return name(guard, itemToFloor(guard, middle), door.name);
    }),
    name(guard, corner),
  ];
}

/** A hinged leaf standing open and the quarter circle that it swings through; a sliding one pushed half aside. */
export function doorPath({ door, fromMm, toMm, opensTo }: PlacedDoor): PointMm[] {
  const [hinge, latch] = door.hinge === 'start' ? [fromMm, toMm] : [toMm, fromMm];
  const [wx, wy] = [latch[0] - hinge[0], latch[1] - hinge[1]];
  const width = Math.hypot(wx, wy);
  if (door.kind === 'sliding') {
    const at = (share: number): PointMm => [
      hinge[0] + wx * share + opensTo[0] * 40,
      hinge[1] + wy * share + opensTo[1] * 40,
    ];
    return [at(0.5), at(-0.5)];
  }
  const arc = Array.from({ length: SWING_SIDES + 1 }, (_, index): PointMm => {
    const turn = (index / SWING_SIDES) * (Math.PI / 2);
    const [along, across] = [Math.cos(turn), Math.sin(turn) * width];
    return [hinge[0] + wx * along + opensTo[0] * across, hinge[1] + wy * along + opensTo[1] * across];
  });
  return [...arc, hinge];
}

/** The quarter circle of a door leaf is flattened to this many sides. */
const SWING_SIDES = 12;

export function walkwayShapes(walkway: Walkway): Shape[] {
  const edges = walkwayEdges(walkway.pointsMm, walkway.widthMm);
  const [first, second] = onFloor(walkway, walkway.pointsMm);
  const along = (Math.atan2(second[1] - first[1], second[0] - first[0]) * 180) / Math.PI;
  const words = walkway.name.includes(String(walkway.widthMm))
    ? walkway.name
    : `${walkway.name}, keep ${walkway.widthMm} mm clear`;
  return [
    ...edges.map((edge) => detail(walkway, 'WALKWAYS', edge)),
    name(walkway, [(first[0] + second[0]) / 2, (first[1] + second[1]) / 2], words, uprightDeg(along)),
  ];
}

/** Where a device notices somebody. */
export function deviceShapes(device: ProtectiveDevice): Shape[] {
  const line = { ...detail(device, 'PROTECTIVE-DEVICES', device.pointsMm), part: 'body' as const };
  return [line, name(device, line.points[0])];
}
