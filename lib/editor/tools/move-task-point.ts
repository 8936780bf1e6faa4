import { floorToItem, itemToFloor } from '@/lib/layout/geometry';
import type { Fixture } from '@/lib/layout/items';
import { tidy } from '../snapping';
import { state, type Press, type Target, type Tool, type View } from './tool';

/** Dragging one task point over the floor; it stays in its fixture's frame and keeps its height. */
export function movingTaskPoint(
  start: Press,
  target: Extract<Target, { part: 'taskPoint' }>,
  view: View,
  rest: () => Tool,
): Tool {
  const fixture = view.items.get(target.itemId);
  const point = fixture?.kind === 'fixture' && fixture.taskPoints.find(({ id }) => id === target.taskPointId);
  if (fixture?.kind !== 'fixture' || !point || fixture.locked) {
    return state('select', 'It is locked.', { busy: true, release: () => ({ tool: rest() }), cancel: rest });
  }
  const [pressedX, pressedY] = itemToFloor(fixture, [point.xMm, point.yMm]);

  // It snaps as a spot, and not to the fixture that carries it, its own old place included.
  const box = { minXMm: pressedX, minYMm: pressedY, maxXMm: pressedX, maxYMm: pressedY };
  const own = { at: { xMm: pressedX, yMm: pressedY }, box, itemIds: new Set([fixture.id]) };

  const at = (press: Press, now: View): Fixture => {
    const wanted = { xMm: pressedX + press.xMm - start.xMm, yMm: pressedY + press.yMm - start.yMm };
    const spot = now.snap(wanted, press, own);
    const [xMm, yMm] = floorToItem(fixture, [spot.xMm, spot.yMm]).map(tidy);
    return {
      ...fixture,
      taskPoints: fixture.taskPoints.map((entry) => (entry.id === point.id ? { ...entry, xMm, yMm } : entry)),
    };
  };

  const self = state('select', 'Release to put the task point down. Escape takes it back.', {
    busy: true,
    move: (press, now) => ({ tool: self, draft: { items: [at(press, now)] } }),
    release: (press, now) => ({
      tool: rest(),
      draft: null,
      step: { label: `Move ${point.name}`, changes: [{ itemId: fixture.id, before: fixture, after: at(press, now) }] },
    }),
    cancel: rest,
  });
  return self;
}
