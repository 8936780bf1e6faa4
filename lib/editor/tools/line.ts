import { distanceMm, type PointMm } from '@/lib/layout/geometry';
import type { Item } from '@/lib/layout/items';
import { put } from '../changes';
import { onRoundAngle } from '../snapping';
import { newLine, type LineKind } from '../make-items';
import { selectTool } from './select';
import { chosen, state, type Press, type Reply, type Tool, type View } from './tool';

const DRAFT_ID = '00000000-0000-4000-8000-000000000001';
const HINTS: Record<LineKind, { first: string; next: string }> = {
  guardLine: {
    first: 'Click the first corner of the guard line, or drag a rectangle.',
    next: 'Click the next corner. Click the first one or press Enter to close the line, Escape to drop it.',
  },
  walkway: {
    first: 'Click where the walkway starts.',
    next: 'Click the next corner. Enter or a double click ends the walkway, Escape drops it.',
  },
  conveyor: {
    first: 'Click where the conveyor begins; it carries the way you draw it.',
    next: 'Click the next corner. Enter or a double click ends the conveyor, Escape drops it.',
  },
  protectiveDevice: {
    first: 'Click where the protective device begins.',
    next: 'Click the next corner. Enter or a double click ends the device, Escape drops it.',
  },
};

/** Rests with no corner set. */
export function lineTool(kind: LineKind): Tool {
  return state(kind, HINTS[kind].first, {
    busy: true,
    press: (press, view) => ({ tool: pressedCorner(kind, [], press, cornerAt(press, view, [])) }),
    cancel: selectTool,
  });
}

/** Shift keeps the new side level or upright; a side that nearly runs at a round angle runs at it. */
function cornerAt(press: Press, view: View, corners: readonly PointMm[]): PointMm {
  const spot = view.snap(press, press);
  const last = corners.at(-1);
  if (!last) return [spot.xMm, spot.yMm];
  if (!press.shift) return (press.alt ? null : onRoundAngle(last, press, view.snapping)) ?? [spot.xMm, spot.yMm];
  const level = Math.abs(spot.xMm - last[0]) >= Math.abs(spot.yMm - last[1]);
  return level ? [spot.xMm, last[1]] : [last[0], spot.yMm];
}

/** A button is down on a new corner. From the first one a drag draws a rectangle; everywhere else the corner just follows. */
function pressedCorner(kind: LineKind, corners: readonly PointMm[], start: Press, corner: PointMm): Tool {
  const isRectangle = (press: Press) =>
    kind === 'guardLine' &&
    corners.length === 0 &&
    Math.abs(press.xMm - start.xMm) > start.slackMm * 3 &&
    Math.abs(press.yMm - start.yMm) > start.slackMm * 3;
  const rectangle = ([x, y]: PointMm): PointMm[] => [corner, [x, corner[1]], [x, y], [corner[0], y]];
  const self: Tool = state(kind, HINTS[kind].next, {
    busy: true,
    move: (press, view) => {
      const to = cornerAt(press, view, corners);
      const draft = isRectangle(press)
        ? drawn(kind, rectangle(to), true, view)
        : drawn(kind, [...corners, to], false, view);
      return { tool: self, draft };
    },
    release: (press, view) => {
      const to = cornerAt(press, view, corners);
      if (isRectangle(press) && to[0] !== corner[0] && to[1] !== corner[1]) {
        return placed(kind, rectangle(to), true, view);
      }
      const [first] = corners;
      if (kind === 'guardLine' && corners.length >= 3 && distanceMm(first, to) <= press.slackMm * 2) {
        return placed(kind, corners, true, view);
      }
      const last = corners.at(-1);
      const next = last && distanceMm(last, to) === 0 ? corners : [...corners, to];
      return { tool: extending(kind, next), draft: drawn(kind, next, false, view) };
    },
    cancel: () => lineTool(kind),
    interrupted: () => (corners.length > 0 ? extending(kind, corners) : lineTool(kind)),
  });
  return self;
}

/** Some corners are set; the next one follows the pointer. */
function extending(kind: LineKind, corners: readonly PointMm[]): Tool {
  const self: Tool = state(kind, HINTS[kind].next, {
    busy: true,
    move: (press, view) => ({
      tool: self,
      draft: drawn(kind, [...corners, cornerAt(press, view, corners)], false, view),
    }),
    press: (press, view) => ({ tool: pressedCorner(kind, corners, press, cornerAt(press, view, corners)) }),
    finish: (view) => {
      if (corners.length < 2) return { tool: self, say: 'A line needs at least two points. Click the next one.' };
      return placed(kind, corners, corners.length >= 3, view);
    },
    cancel: () => lineTool(kind),
  });
  return self;
}

function drawn(kind: LineKind, corners: readonly PointMm[], closed: boolean, { items }: View): Reply['draft'] {
  const distinct = corners.filter((corner, index) => index === 0 || distanceMm(corner, corners[index - 1]) > 0);
  return { items: distinct.length < 2 ? [] : [newLine(items, kind, DRAFT_ID, distinct, closed)] };
}

function placed(kind: LineKind, corners: readonly PointMm[], closed: boolean, { items, newId }: View): Reply {
  const item: Item = newLine(items, kind, newId(), corners, closed);
  const step = { label: `Place ${item.name}`, changes: [put(items, item)] };
  return { tool: selectTool(), draft: null, selection: chosen(item.id), step };
}
