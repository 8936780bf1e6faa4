import type { Item } from '@/lib/layout/items';
import { boundsOfPoints, unionBounds, type FloorBounds } from '@/lib/layout/viewport';
import { footprint } from './footprint';

/** Kinds that the work happens at; walkways and dimensions reach far beyond it. */
const WORK_KINDS: readonly Item['kind'][] = ['robot', 'fixture', 'obstacle', 'conveyor', 'guardLine'];
/** How much of a robot's reach a reader wants to see round its base. */
const SEEN_REACH_SHARE = 0.85;

/** The part of the floor that a reader is shown first; null for an empty sheet. */
export function readingBounds(
  items: readonly Item[],
  arms: ReadonlyMap<string, { readonly reachMm: number }>,
): FloorBounds | null {
  let bounds: FloorBounds | null = null;
  for (const item of items) {
    if (item.hidden || !WORK_KINDS.includes(item.kind)) continue;
    bounds = unionBounds(bounds, boundsOfPoints(footprint(item)));
    if (item.kind !== 'robot') continue;
    const reach = (arms.get(item.armId)?.reachMm ?? 0) * SEEN_REACH_SHARE;
    bounds = unionBounds(bounds, {
      minXMm: item.xMm - reach,
      maxXMm: item.xMm + reach,
      minYMm: item.yMm - reach,
      maxYMm: item.yMm + reach,
    });
  }
  return bounds;
}
