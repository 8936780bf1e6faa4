import type { PointMm } from '@/lib/layout/geometry';
import type { Fixture, Item, TaskPoint } from '@/lib/layout/items';
import { toolAxes } from '@/lib/layout/tool-orientation';

/** Something of a chosen item that can be taken hold of by itself. */
export type Grip =
  /** A corner of an outline or a line. */
  | { readonly kind: 'corner'; readonly index: number }
  /** The middle of the side after this corner: taking hold of it makes a new corner. */
  | { readonly kind: 'side'; readonly index: number }
  /** An end of a dimension or a section line. */
  | { readonly kind: 'end'; readonly end: 'from' | 'to' }
  /** The line of a dimension, which stands off what it measures. */
  | { readonly kind: 'offset' }
  /** Where the tool points at a task point, and how it is rolled. Their knobs stand off by pixels: `pxMm` is one on the floor. */
  | { readonly kind: 'aim'; readonly taskPointId: string; readonly pxMm: number }
  | { readonly kind: 'roll'; readonly taskPointId: string; readonly pxMm: number };

/** A grip where it is drawn, in the item's frame. */
export interface PlacedGrip {
  readonly grip: Grip;
  readonly atMm: PointMm;
}

/** Knobs of a task point: the one of the tilt runs from straight down to straight up, px from the point. */
export const AIM_PX = { down: 18, up: 98 } as const;
export const ROLL_PX = 34;
/** Below this share of the tool's x axis on the floor its heading says nothing, and the roll is only typed. */
const LEAST_SEEN = 0.1;

const middle = ([x1, y1]: PointMm, [x2, y2]: PointMm, share = 0.5): [number, number] => [
  x1 + (x2 - x1) * share,
  y1 + (y2 - y1) * share,
];

function cornerGrips(points: readonly PointMm[], closed: boolean): PlacedGrip[] {
  const sides = closed ? points.length : points.length - 1;
  // The middle of a line of two points is where the whole item is moved by.
  const share = sides === 1 ? 0.25 : 0.5;
  return [
    ...Array.from({ length: sides }, (_, index) => ({
      grip: { kind: 'side', index } as const,
      atMm: middle(points[index], points[(index + 1) % points.length], share),
    })),
    ...points.map((atMm, index) => ({ grip: { kind: 'corner', index } as const, atMm })),
  ];
}

/** Where the dimension line's middle stands, in the dimension's frame. */
function offsetSpot(fromMm: PointMm, toMm: PointMm, offsetMm: number): [number, number] {
  const [x, y] = middle(fromMm, toMm);
  const length = Math.hypot(toMm[0] - fromMm[0], toMm[1] - fromMm[1]) || 1;
  return [x - ((toMm[1] - fromMm[1]) / length) * offsetMm, y + ((toMm[0] - fromMm[0]) / length) * offsetMm];
}

/** Every grip of an item, with those of its chosen task point last. `pxMm` is one pixel on the floor. */
export function gripsOf(item: Item, chosenPointId: string | null, pxMm: number): PlacedGrip[] {
  switch (item.kind) {
    case 'fixture': {
      const point = item.taskPoints.find(({ id }) => id === chosenPointId);
      return point ? aimGrips(point, pxMm) : cornerGrips(item.outlineMm, true);
    }
    case 'obstacle':
    case 'zone':
      return cornerGrips(item.outlineMm, true);
    case 'guardLine':
      return cornerGrips(item.pointsMm, item.closed);
    case 'walkway':
    case 'conveyor':
    case 'protectiveDevice':
      return cornerGrips(item.pointsMm, false);
    case 'dimension':
      return [
        { grip: { kind: 'offset' }, atMm: offsetSpot(item.fromMm, item.toMm, item.offsetMm) },
        { grip: { kind: 'end', end: 'from' }, atMm: item.fromMm },
        { grip: { kind: 'end', end: 'to' }, atMm: item.toMm },
      ];
    case 'sectionLine':
      return [
        { grip: { kind: 'end', end: 'from' }, atMm: item.fromMm },
        { grip: { kind: 'end', end: 'to' }, atMm: item.toMm },
      ];
    case 'robot':
    case 'note':
      return [];
  }
}

function aimGrips(point: TaskPoint, pxMm: number): PlacedGrip[] {
  const { xMm, yMm, tiltDeg, azimuthDeg } = point;
  const heading = (azimuthDeg * Math.PI) / 180;
  const out = (AIM_PX.down + ((AIM_PX.up - AIM_PX.down) * tiltDeg) / 180) * pxMm;
  const aim: PlacedGrip = {
    grip: { kind: 'aim', taskPointId: point.id, pxMm },
    atMm: [xMm + out * Math.cos(heading), yMm + out * Math.sin(heading)],
  };
  const roll = rollHeadingRad(point);
  if (roll === null) return [aim];
  const atMm: PointMm = [xMm + ROLL_PX * pxMm * Math.cos(roll), yMm + ROLL_PX * pxMm * Math.sin(roll)];
  return [{ grip: { kind: 'roll', taskPointId: point.id, pxMm }, atMm }, aim];
}

/** Where the tool's x axis points on the floor, in the fixture's frame; null where it is free or points up or down. */
export function rollHeadingRad(point: TaskPoint): number | null {
  if (point.rollDeg === 'free') return null;
  const { x } = toolAxes(point);
  return Math.hypot(x[0], x[1]) < LEAST_SEEN ? null : Math.atan2(x[1], x[0]);
}

/** The roll that turns the tool's x axis as near as it can get to a heading of the floor, degrees; null where none does. */
export function rollTowards(point: TaskPoint, headingRad: number): number | null {
  const { x, y } = toolAxes({ ...point, rollDeg: 0 });
  const [cosine, sine] = [Math.cos(headingRad), Math.sin(headingRad)];
  const [alongX, alongY] = [x[0] * cosine + x[1] * sine, y[0] * cosine + y[1] * sine];
  if (Math.hypot(alongX, alongY) < LEAST_SEEN) return null;
  return (Math.atan2(alongY, alongX) * 180) / Math.PI;
}

/** Tilt and azimuth that the knob of the aim stands for when it is drawn `dx`, `dy` from its point, in the fixture's frame. */
export function aimTowards(dxMm: number, dyMm: number, pxMm: number): { tiltDeg: number; azimuthDeg: number } {
  const out = Math.hypot(dxMm, dyMm) / pxMm;
  const share = (out - AIM_PX.down) / (AIM_PX.up - AIM_PX.down);
  return {
    tiltDeg: Math.min(Math.max(share, 0), 1) * 180,
    azimuthDeg: (Math.atan2(dyMm, dxMm) * 180) / Math.PI,
  };
}

export const pointOf = (fixture: Fixture, taskPointId: string): TaskPoint | undefined =>
  fixture.taskPoints.find(({ id }) => id === taskPointId);
