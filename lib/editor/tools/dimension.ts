import { distanceMm, turned, type PointMm } from '@/lib/layout/geometry';
import { put } from '../changes';
import { newDimension } from '../make-items';
import { tidy } from '../snapping';
import { selectTool } from './select';
import { chosen, state, type Press, type Tool, type View } from './tool';

const DRAFT_ID = '00000000-0000-4000-8000-000000000002';

/** A robot or fixture that is clicked is measured from its place; elsewhere the floor spot counts, on the grid. */
function measuredSpot(press: Press, view: View): PointMm {
  const item = press.target?.part === 'item' ? view.items.get(press.target.itemId) : undefined;
  if (item && (item.kind === 'robot' || item.kind === 'fixture') && !press.alt) return [item.xMm, item.yMm];
  const spot = view.snap(press, press);
  return [spot.xMm, spot.yMm];
}

/** From point, to point, then where the dimension line stands. */
export function dimensionTool(): Tool {
  return state('dimension', 'Click the first point to measure from.', {
    busy: true,
    release: (press, view) => ({ tool: measuring(measuredSpot(press, view)) }),
    cancel: selectTool,
  });
}

function measuring(from: PointMm): Tool {
  const self: Tool = state('dimension', 'Click the second point. Shift keeps the line level or upright.', {
    busy: true,
    move: (press, view) => {
      const to = toward(from, press, view);
      const items = distanceMm(from, to) > 0 ? [newDimension(view.items, DRAFT_ID, from, to, 0)] : [];
      return { tool: self, draft: { items } };
    },
    release: (press, view) => {
      const to = toward(from, press, view);
      return distanceMm(from, to) > 0 ? { tool: standingOff(from, to) } : { tool: self };
    },
    cancel: dimensionTool,
  });
  return self;
}

function toward(from: PointMm, press: Press, view: View): PointMm {
  const [x, y] = measuredSpot(press, view);
  if (!press.shift) return [x, y];
  return Math.abs(x - from[0]) >= Math.abs(y - from[1]) ? [x, from[1]] : [from[0], y];
}

function standingOff(from: PointMm, to: PointMm): Tool {
  const headingDeg = (Math.atan2(to[1] - from[1], to[0] - from[0]) * 180) / Math.PI;
  const offset = (press: Press, { snapping }: View) => {
    const [, left] = turned([press.xMm - from[0], press.yMm - from[1]], -headingDeg);
    return press.alt || !snapping.gridMm ? tidy(left) : tidy(Math.round(left / snapping.gridMm) * snapping.gridMm);
  };
  const self: Tool = state('dimension', 'Click where the dimension line stands.', {
    busy: true,
    move: (press, view) => ({
      tool: self,
      draft: { items: [newDimension(view.items, DRAFT_ID, from, to, offset(press, view))] },
    }),
    release: (press, view) => {
      const item = newDimension(view.items, view.newId(), from, to, offset(press, view));
      const step = { label: `Place ${item.name}`, changes: [put(view.items, item)] };
      return { tool: selectTool(), draft: null, selection: chosen(item.id), step };
    },
    cancel: dimensionTool,
  });
  return self;
}
