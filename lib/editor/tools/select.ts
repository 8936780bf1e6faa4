import { isAttached, settledItems } from '@/lib/layout/attached-dimensions';
import { boundsOfPoints } from '@/lib/layout/viewport';
import type { PointMm } from '@/lib/layout/geometry';
import { footprint, liesInside } from '../footprint';
import { withGroups } from '../groups';
import {
  chosen,
  NOTHING,
  state,
  type Press,
  type Reply,
  type Selection,
  type Target,
  type Tool,
  type View,
} from './tool';
import { gripping } from './grip';
import { movingItems } from './move';
import { movingTaskPoint } from './move-task-point';
import { turning } from './turn';

/** Rests until something is pressed. */
export function selectTool(): Tool {
  return state('select', 'Click to choose, drag to move, Shift to choose several.', { press });
}

function press(at: Press, view: View): Reply {
  const { target } = at;
  if (!target) return { tool: marquee([at.xMm, at.yMm], at.shift ? view.selection : NOTHING) };
  if (target.part === 'turn') return { tool: turning(at, view, selectTool) };
  if (target.part === 'grip') return { tool: gripping(at, target.itemId, target.grip, view, selectTool) };
  const selection = selectionAfter(target, at.shift, view);
  const wasChosen = view.selection.itemIds.includes(target.itemId);
  return { tool: pressed(at, target, selection, wasChosen), selection };
}

/**
 * A press on something already chosen keeps the selection, so that several things can be dragged by any one of them. Groups are
 * chosen whole.
 */
function selectionAfter(target: Target, shift: boolean, { items, selection }: View): Selection {
  const { itemId } = target;
  if (target.part === 'taskPoint') return { itemIds: [itemId], taskPointId: target.taskPointId };
  const isChosen = selection.itemIds.includes(itemId);
  const unit = withGroups(items, [itemId]);
  if (shift && isChosen) return chosen(...selection.itemIds.filter((id) => !unit.includes(id)));
  if (shift) return chosen(...new Set([...selection.itemIds, ...unit]));
  return isChosen ? { ...selection, taskPointId: null } : chosen(...unit);
}

/** A click on one of several chosen things chooses its group, and on a chosen group the one thing in it. */
function narrowed(itemId: string, selection: Selection, { items }: View): Selection {
  const unit = withGroups(items, [itemId]);
  const isGroupAlone = unit.length === selection.itemIds.length && unit.every((id) => selection.itemIds.includes(id));
  return isGroupAlone ? chosen(itemId) : chosen(...unit);
}

/** Down on something, not yet dragged. */
function pressed(start: Press, target: Target, selection: Selection, wasChosen: boolean): Tool {
  const self = state('select', 'Drag to move.', {
    busy: true,
    move: (at, view) => {
      if (Math.hypot(at.xMm - start.xMm, at.yMm - start.yMm) < start.slackMm) return { tool: self };
      return dragging(start, target, selection, view).move(at, view);
    },
    release: (_, view) => {
      const narrows = target.part === 'item' && !start.shift && wasChosen && selection.itemIds.length > 1;
      return { tool: selectTool(), selection: narrows ? narrowed(target.itemId, selection, view) : selection };
    },
    cancel: selectTool,
  });
  return self;
}

function dragging(start: Press, target: Target, selection: Selection, view: View): Tool {
  if (target.part === 'taskPoint') return movingTaskPoint(start, target, view, selectTool);
  const item = view.items.get(target.itemId);
  // What a dimension measures keeps its ends in place, so only its line can go elsewhere.
  const isHeld = item !== undefined && isAttached(item) && selection.itemIds.length === 1;
  return isHeld
    ? gripping(start, target.itemId, { kind: 'offset' }, view, selectTool)
    : movingItems(start, selection, view, selectTool);
}

/** A rectangle drawn from an empty spot chooses what lies wholly inside; a plain click chooses nothing. */
function marquee(from: PointMm, kept: Selection): Tool {
  const reply = (at: Press, view: View): Selection => {
    const area = boundsOfPoints([from, [at.xMm, at.yMm]]);
    const inside = settledItems([...view.items.values()]).filter((item) => {
      const bounds = boundsOfPoints(footprint(item));
      return !item.hidden && bounds && area && liesInside(bounds, area);
    });
    const ids = withGroups(
      view.items,
      inside.map(({ id }) => id),
    );
    return chosen(...new Set([...kept.itemIds, ...ids]));
  };
  const self = state('select', 'Draw round what you want to choose.', {
    busy: true,
    move: (at) => ({ tool: self, draft: { items: [], marquee: { from, to: [at.xMm, at.yMm] } } }),
    release: (at, view) => ({ tool: selectTool(), draft: null, selection: reply(at, view) }),
    cancel: selectTool,
  });
  return self;
}
