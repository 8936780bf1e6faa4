import { itemToFloor, type PointMm } from '@/lib/layout/geometry';
import type { Item } from '@/lib/layout/items';
import type { Items } from './changes';
import { footprint } from './footprint';
import type { Measured } from './make-items';
import { tidy } from './snapping';
import type { Press, View } from './tools/tool';

/** How near to a corner or a task point a click must be to measure from there, in slacks of the pointer. */
const NEAR_SLACKS = 3;

/** Places of an item that are worth measuring from. */
function marksOf(item: Item): PointMm[] {
  const points = item.kind === 'fixture' ? item.taskPoints : [];
  return [
    [item.xMm, item.yMm],
    ...(item.kind === 'robot' ? [] : footprint(item)),
    ...points.map((point) => itemToFloor(item, [point.xMm, point.yMm])),
  ];
}

/** The mark nearest to a press of all items that are shown; null where none is near. */
export function markUnder(items: Items, press: Press): Measured | null {
  const reach = press.slackMm * NEAR_SLACKS;
  let best: Measured | null = null;
  let least = Infinity;
  for (const item of items.values()) {
    if (item.hidden || item.kind === 'dimension' || item.kind === 'note') continue;
    for (const mark of marksOf(item)) {
      const distance = Math.hypot(mark[0] - press.xMm, mark[1] - press.yMm);
      if (distance > reach || distance >= least) continue;
      least = distance;
      best = { atMm: [tidy(mark[0]), tidy(mark[1])], item };
    }
  }
  return best;
}

/**
 * What a press measures from: the nearest corner, task point or place of what is clicked, which the dimension then follows; a
 * robot's and a fixture's place from anywhere on them. With Alt, and beside everything, the floor spot counts.
 */
export function measuredSpot(press: Press, view: View): Measured {
  const target = press.target?.part === 'item' || press.target?.part === 'taskPoint' ? press.target : null;
  const item = press.alt || !target ? undefined : view.items.get(target.itemId);
  if (!item || item.kind === 'dimension') return floorSpot(press, view);
  const near = markUnder(new Map([[item.id, item]]), press);
  if (near) return near;
  if (item.kind === 'robot' || item.kind === 'fixture') return { atMm: [item.xMm, item.yMm], item };
  return { ...floorSpot(press, view), item };
}

function floorSpot(press: Press, view: View): Measured {
  const { xMm, yMm } = view.snap(press, press);
  return { atMm: [xMm, yMm] };
}
