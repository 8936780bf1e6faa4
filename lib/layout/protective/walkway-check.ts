import { outlinesMeet, sidesOf } from '../clearance/plane';
import { itemToFloor, type PointMm } from '../geometry';
import type { Item, Walkway } from '../items';
import { takenOutlines } from '../standing/taken-floor';
import { walkwayEdges } from '../walkway-edges';
import type { DistanceValues } from './distance-values';

export interface WalkwayRow {
  readonly walkwayId: string;
  readonly name: string;
  readonly widthMm: number;
  /** Against the least and the better width: below, between, or as wide as the better one. */
  readonly rank: 'below' | 'least' | 'better';
  /** What stands in it: items by id and name. */
  readonly inTheWay: readonly { readonly id: string; readonly name: string }[];
}

/** Every walkway against the widths, and what stands in it. Guard lines that only run along its edge count as standing in it too. */
export function walkwayRows(items: readonly Item[], values: DistanceValues, halfPlateMm: number): WalkwayRow[] {
  return items
    .filter((item): item is Walkway => item.kind === 'walkway' && !item.hidden)
    .map((walkway) => {
      const { id, name, widthMm } = walkway;
      const strips = stripsOf(walkway);
      const inTheWay = items.filter((item) => {
        if (item.id === id || item.kind === 'walkway' || item.kind === 'zone') return false;
        return takenOutlines([item], '', halfPlateMm).some((outline) =>
          strips.some((strip) => outlinesMeet(strip, outline)),
        );
      });
      const rank = widthMm < values.walkwayLeastMm ? 'below' : widthMm < values.walkwayBetterMm ? 'least' : 'better';
      return {
        walkwayId: id,
        name,
        widthMm,
        rank,
        inTheWay: inTheWay.map((item) => ({ id: item.id, name: item.name })),
      };
    });
}

/** A hair narrower than drawn, so that what stands beside it does not stand in it. */
const SLACK_MM = 1;

function stripsOf(walkway: Walkway): PointMm[][] {
  return sidesOf(walkway.pointsMm, false)
    .filter(([from, to]) => Math.hypot(to[0] - from[0], to[1] - from[1]) > 0)
    .map(([from, to]) => {
      const [left, right] = walkwayEdges([from, to], Math.max(1, walkway.widthMm - 2 * SLACK_MM));
      return [...left, ...right.reverse()].map((point) => itemToFloor(walkway, point));
    });
}
