import type { LibraryArm } from '@/lib/contracts/arms';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import type { Items } from '@/lib/editor/changes';
import { boundsOfItems } from '@/lib/editor/place-in-view';
import { unionBounds, type FloorBounds } from '@/lib/layout/viewport';
import { floorPlanBounds } from './floor-plan-bounds';

/** The whole sheet: everything on it with the robots' reach, or the floor plan while nothing is placed. */
export function sheetBounds(
  items: Items,
  arms: ReadonlyMap<string, LibraryArm>,
  floorPlan: FloorPlan | null,
): FloorBounds | null {
  let bounds = boundsOfItems(items);
  for (const item of items.values()) {
    if (item.kind !== 'robot' || item.hidden) continue;
    const reachMm = arms.get(item.armId)?.reachMm ?? 0;
    bounds = unionBounds(bounds, {
      minXMm: item.xMm - reachMm,
      minYMm: item.yMm - reachMm,
      maxXMm: item.xMm + reachMm,
      maxYMm: item.yMm + reachMm,
    });
  }
  return bounds ?? floorPlanBounds(floorPlan);
}
