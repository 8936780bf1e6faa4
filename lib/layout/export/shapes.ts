import type { Arm } from '@/lib/kinematics/types';
import { itemToFloor, type PointMm } from '../geometry';
import type { Item } from '../items';

/**
 * A sheet as plain lines on named layers, floor frame, mm: what the DXF holds and what reports and pictures draw. No line widths and
 * no colours: whoever draws knows the paper.
 */

export const LAYERS = [
  'WALKWAYS',
  'ZONES',
  'CONVEYORS',
  'OBSTACLES',
  'FIXTURES',
  'GUARD-LINES',
  'PROTECTIVE-DEVICES',
  'REACH',
  'ROBOTS',
  'TASK-POINTS',
  'DIMENSIONS',
  'SECTIONS',
  'NOTES',
  'NAMES',
] as const;
export type Layer = (typeof LAYERS)[number];

export type Shape = Line | Circle | Spot | Words;

export interface Line {
  readonly kind: 'line';
  readonly layer: Layer;
  readonly itemId: string;
  readonly points: readonly PointMm[];
  readonly closed: boolean;
  /** Height of its lowest edge above the floor, mm. */
  readonly zMm: number;
  /** `body` is the outline of something solid, `detail` a line within or beside it. */
  readonly part: 'body' | 'detail' | 'link' | 'arrow';
}
export interface Circle {
  readonly kind: 'circle';
  readonly layer: Layer;
  readonly itemId: string;
  readonly centre: PointMm;
  readonly radiusMm: number;
  readonly zMm: number;
  readonly part: 'body' | 'detail';
}
/** A task point. */
export interface Spot {
  readonly kind: 'spot';
  readonly layer: 'TASK-POINTS';
  readonly itemId: string;
  readonly pointId: string;
  readonly name: string;
  readonly at: readonly [number, number, number];
}
export interface Words {
  readonly kind: 'words';
  readonly layer: 'NAMES' | 'DIMENSIONS' | 'SECTIONS' | 'NOTES';
  readonly itemId: string;
  readonly of: Item['kind'];
  readonly at: PointMm;
  /** Turn of the baseline, upright to a reader, degrees. */
  readonly angleDeg: number;
  readonly text: string;
  /** Height of the letters on the floor where the sheet gives one, mm. */
  readonly heightMm?: number;
}

/** What is known of a robot's arm, and the posture that it is drawn in (rad or m); none draws its base alone. */
export interface DrawnRobot {
  readonly definition: Arm;
  readonly reachMm: number;
  readonly posture?: readonly number[];
}

export const onFloor = (item: Item, points: readonly PointMm[]): [number, number][] =>
  points.map((point) => itemToFloor(item, point));

/** The outline of something solid, given in the item's frame. */
export function body(item: Item, layer: Layer, points: readonly PointMm[], zMm: number): Line {
  return { kind: 'line', layer, itemId: item.id, points: onFloor(item, points), closed: true, zMm, part: 'body' };
}

/** A line within or beside it, given in the item's frame. */
export function detail(
  item: Item,
  layer: Layer,
  points: readonly PointMm[],
  part: Line['part'] = 'detail',
  zMm = 0,
): Line {
  return { kind: 'line', layer, itemId: item.id, points: onFloor(item, points), closed: false, zMm, part };
}

/** A name at a place of the floor. */
export function name(item: Item, at: PointMm, text = item.name, angleDeg = 0): Words {
  return { kind: 'words', layer: 'NAMES', itemId: item.id, of: item.kind, at, angleDeg, text };
}

/** Within (−90, 90]: letters never stand on their heads. */
export function uprightDeg(angleDeg: number): number {
  const wrapped = ((((angleDeg + 180) % 360) + 360) % 360) - 180;
  if (wrapped > 90) return wrapped - 180;
  return wrapped <= -90 ? wrapped + 180 : wrapped;
}
