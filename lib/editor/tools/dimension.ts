import { distanceMm, turned } from '@/lib/layout/geometry';
import { put } from '../changes';
import { newDimension, type Measured } from '../make-items';
import { measuredSpot } from '../marks';
import { tidy } from '../snapping';
import { selectTool } from './select';
import { chosen, state, type Press, type Tool, type View } from './tool';

const DRAFT_ID = '00000000-0000-4000-8000-000000000002';

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
