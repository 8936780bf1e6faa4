import { distanceMm, itemToFloor, turned, type PointMm } from '@/lib/layout/geometry';
import type { Item } from '@/lib/layout/items';
import { put } from '../changes';
import { footprint } from '../footprint';
import { newDimension, type Measured } from '../make-items';
import { tidy } from '../snapping';
import { selectTool } from './select';
import { chosen, state, type Press, type Tool, type View } from './tool';

const DRAFT_ID = '00000000-0000-4000-8000-000000000002';

/** How near to a corner or a task point a click must be to measure from there, in slacks of the pointer. */
const NEAR_SLACKS = 3;

/**
 * What is clicked is measured from its nearest corner, task point or place, and the dimension follows it; with Alt, and beside
 * everything, the floor spot counts.
 */
export function measuredSpot(press: Press, view: View): Measured {
  const target = press.target?.part === 'item' || press.target?.part === 'taskPoint' ? press.target : null;
  const item = target && view.items.get(target.itemId);
  if (item && item.kind !== 'dimension' && !press.alt) {
    const atMm = markNear(item, press);
    if (atMm) return { atMm, item };
  }
  const spot = view.snap(press, press);
  return {
    atMm: [spot.xMm, spot.yMm],
    item: press.alt || item?.kind === 'dimension' ? undefined : (item ?? undefined),
  };
}

/** The mark of an item nearest to the press; a robot's and a fixture's place from anywhere on them. */
function markNear(item: Item, press: Press): PointMm | null {
  const place: PointMm = [item.xMm, item.yMm];
  const points = item.kind === 'fixture' ? item.taskPoints : [];
  const marks: PointMm[] = [
    place,
    ...(item.kind === 'robot' ? [] : footprint(item)),
    ...points.map((point) => itemToFloor(item, [point.xMm, point.yMm])),
  ];
  const distance = ([x, y]: PointMm) => Math.hypot(x - press.xMm, y - press.yMm);
  const nearest = marks.reduce((best, mark) => (distance(mark) < distance(best) ? mark : best));
  if (distance(nearest) <= press.slackMm * NEAR_SLACKS) return [tidy(nearest[0]), tidy(nearest[1])];
  return item.kind === 'robot' || item.kind === 'fixture' ? place : null;
}

/** From point, to point, then where the dimension line stands. */
export function dimensionTool(): Tool {
  return state(
    'dimension',
    'Click the first point to measure from. On an item, the dimension follows it; Alt measures the floor.',
    {
      busy: true,
      release: (press, view) => ({ tool: measuring(measuredSpot(press, view)) }),
      cancel: selectTool,
    },
  );
}

function measuring(from: Measured): Tool {
  const self: Tool = state('dimension', 'Click the second point. Shift keeps the line level or upright.', {
    busy: true,
    move: (press, view) => {
      const to = toward(from, press, view);
      const items = distanceMm(from.atMm, to.atMm) > 0 ? [newDimension(view.items, DRAFT_ID, from, to, 0)] : [];
      return { tool: self, draft: { items } };
    },
    release: (press, view) => {
      const to = toward(from, press, view);
      return distanceMm(from.atMm, to.atMm) > 0 ? { tool: standingOff(from, to) } : { tool: self };
    },
    cancel: dimensionTool,
  });
  return self;
}

function toward({ atMm: from }: Measured, press: Press, view: View): Measured {
  const spot = measuredSpot(press, view);
  if (!press.shift) return spot;
  // Held level or upright, the end stands beside the item that was clicked and not on it.
  const [x, y] = spot.atMm;
  return { atMm: Math.abs(x - from[0]) >= Math.abs(y - from[1]) ? [x, from[1]] : [from[0], y] };
}

function standingOff(start: Measured, end: Measured): Tool {
  const [from, to] = [start.atMm, end.atMm];
  const headingDeg = (Math.atan2(to[1] - from[1], to[0] - from[0]) * 180) / Math.PI;
  const offset = (press: Press, { snapping }: View) => {
    const [, left] = turned([press.xMm - from[0], press.yMm - from[1]], -headingDeg);
    return press.alt || !snapping.gridMm ? tidy(left) : tidy(Math.round(left / snapping.gridMm) * snapping.gridMm);
  };
  const self: Tool = state('dimension', 'Click where the dimension line stands.', {
    busy: true,
    move: (press, view) => ({
      tool: self,
      draft: { items: [newDimension(view.items, DRAFT_ID, start, end, offset(press, view))] },
    }),
    release: (press, view) => {
      const item = newDimension(view.items, view.newId(), start, end, offset(press, view));
      const step = { label: `Place ${item.name}`, changes: [put(view.items, item)] };
      return { tool: selectTool(), draft: null, selection: chosen(item.id), step };
    },
    cancel: dimensionTool,
  });
  return self;
}
