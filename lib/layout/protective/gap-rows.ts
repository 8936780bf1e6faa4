import { outlinesMeet, segmentDistance, sidesOf } from '../clearance/plane';
import type { PointMm } from '../geometry';
import type { Item } from '../items';
import type { Space } from '../spaces/spaces';
import { takenOutlines } from '../standing/taken-floor';
import { DISTANCE_VALUE_WORDS, type DistanceValue, type DistanceValues } from './distance-values';

/** A gap between a robot's space and something fixed in which somebody could be crushed. */
export interface GapRow {
  readonly itemId: string;
  readonly name: string;
  /** In plan; 0 where the space reaches the thing. */
  readonly gapMm: number;
  /** The largest part of the body whose least gap is kept; null: not even a finger's. */
  readonly keeps: DistanceValue | null;
}

const PARTS = ['bodyMm', 'headMm', 'legMm', 'armMm', 'footMm', 'fistMm', 'toesMm', 'fingerMm'] as const;

/** Fixed things nearer to a space than a body needs, nearest first. In plan: heights are not looked at. */
export function gapRows(items: readonly Item[], space: Space, values: DistanceValues): GapRow[] {
  return items
    .filter(({ kind }) => kind === 'obstacle' || kind === 'guardLine' || kind === 'conveyor')
    .map((item) => ({ item, gapMm: gapOf(takenOutlines([item], '', 0), space.outlineMm) }))
    .filter(({ gapMm }) => gapMm < values.bodyMm)
    .map(({ item, gapMm }) => ({ itemId: item.id, name: item.name, gapMm, keeps: keptBy(gapMm, values) }))
    .sort((one, other) => one.gapMm - other.gapMm);
}

function gapOf(outlines: readonly (readonly PointMm[])[], space: readonly PointMm[]): number {
  if (outlines.some((outline) => outlinesMeet(outline, space))) return 0;
  const sides = sidesOf(space, true);
  return outlines.reduce(
    (least, outline) =>
      sidesOf(outline, true).reduce(
        (near, [a, b]) => sides.reduce((found, [c, d]) => Math.min(found, segmentDistance(a, b, c, d)), near),
        least,
      ),
    Infinity,
  );
}

function keptBy(gapMm: number, values: DistanceValues): DistanceValue | null {
  const fitting = PARTS.filter((part) => values[part] <= gapMm);
  return fitting.length === 0 ? null : fitting.reduce((best, part) => (values[part] > values[best] ? part : best));
}

/** What a gap leaves room for, in words. */
export const gapWords = ({ keeps }: GapRow): string =>
  keeps === null ? 'less than for a finger' : `room for: ${DISTANCE_VALUE_WORDS[keeps].label.toLowerCase()}`;
