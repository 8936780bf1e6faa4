import { settledDimension } from '@/lib/layout/attached-dimensions';
import { floorToItem, type PointMm } from '@/lib/layout/geometry';
import type { Fixture, Item } from '@/lib/layout/items';
import { cornersOf, rectangleOf } from '@/lib/layout/rectangles';
import { edited, editedTaskPoint, type Edit } from '../edits';
import { aimTowards, pointOf, rollTowards, type Grip } from '../grips';
import { attachment } from '../make-items';
import { markUnder } from '../marks';
import { snapAngle, tidy } from '../snapping';
import { state, type Press, type Reply, type Tool, type View } from './tool';

const HINTS: Record<Grip['kind'], string> = {
  corner: 'Click where the corner goes. Delete takes it away, Escape puts it back, Alt suspends snapping.',
  side: 'Click where the new corner goes. Escape drops it, Alt suspends snapping.',
  end: 'Click where it ends. On an item it follows the item; Alt measures the floor.',
  offset: 'Click where the dimension line stands.',
  aim: 'Click where the tool points: near is down, far is up. Alt suspends the steps.',
  roll: 'Click where the tool’s x axis points. Alt suspends the steps.',
};

const STEP_WORDS: Record<Grip['kind'], string> = {
  corner: 'Move a corner',
  side: 'Add a corner',
  end: 'Move an end',
  offset: 'Move the line',
  aim: 'Turn the tool',
  roll: 'Roll the tool',
};

/**
 * Taking hold of a grip. Dragged, it is put down where it is let go; clicked, it follows the pointer until the next click. What
 * cannot be, such as an outline that crosses itself, is refused in words and everything stays as it was.
 */
export function gripping(start: Press, itemId: string, grip: Grip, view: View, rest: () => Tool): Tool {
  const item = view.items.get(itemId);
  if (!item || item.locked) {
    return state('outline', 'It is locked.', { busy: true, release: () => ({ tool: rest() }), cancel: rest });
  }
  return held(start, item, grip, rest, false);
}

function held(start: Press, item: Item, grip: Grip, rest: () => Tool, isCarried: boolean): Tool {
  const strayed = (press: Press) => Math.hypot(press.xMm - start.xMm, press.yMm - start.yMm) >= start.slackMm;
  const drop = (press: Press, view: View): Reply => {
    const result = gripped(item, grip, press, view);
    if (!result.ok) return { tool: rest(), draft: null, say: result.message };
    const label = `${STEP_WORDS[grip.kind]} of ${item.name}`;
    return {
      tool: rest(),
      draft: null,
      step: { label, changes: [{ itemId: item.id, before: item, after: result.value }] },
    };
  };
  const self: Tool = state('outline', HINTS[grip.kind], {
    busy: true,
    move: (press, view) => {
      if (!isCarried && !strayed(press)) return { tool: self };
      const next = gripped(item, grip, press, view);
      return { tool: self, draft: { items: next.ok ? [next.value] : next.shown ? [next.shown] : [] } };
    },
    release: (press, view) =>
      isCarried || strayed(press) ? drop(press, view) : { tool: held(start, item, grip, rest, true) },
    remove: () => withoutCorner(item, grip, rest),
    cancel: rest,
    interrupted: () => (isCarried ? self : rest()),
  });
  return self;
}

/** Delete while a corner is in hand. */
function withoutCorner(item: Item, grip: Grip, rest: () => Tool): Reply {
  const points = pointsOf(item);
  if (grip.kind !== 'corner' || !points) return { tool: rest(), draft: null };
  const kept = points.filter((_, index) => index !== grip.index);
  const result = withPoints(item, kept);
  if (!result.ok) return { tool: rest(), draft: null, say: result.message };
  const label = `Delete a corner of ${item.name}`;
  return {
    tool: rest(),
    draft: null,
    step: { label, changes: [{ itemId: item.id, before: item, after: result.value }] },
  };
}

/** What became of it, or why that cannot be; `shown` is what to draw meanwhile. */
type Gripped = Edit<Item> & { readonly shown?: Item };

function gripped(item: Item, grip: Grip, press: Press, view: View): Gripped {
  switch (grip.kind) {
    case 'corner':
    case 'side':
      return withCorner(item, grip, cornerSpot(item, press, view));
    case 'end':
      return withEnd(item, grip.end, press, view);
    case 'offset':
      return withOffset(item, press, view);
    case 'aim':
    case 'roll':
      return item.kind === 'fixture' ? withAim(item, grip, press, view) : { ok: true, value: item };
  }
}

type Points = [number, number][];

function pointsOf(item: Item): Points | null {
  return 'outlineMm' in item ? item.outlineMm : 'pointsMm' in item ? item.pointsMm : null;
}

function withPoints(item: Item, points: Points): Gripped {
  const shown = { ...item, ...('outlineMm' in item ? { outlineMm: points } : { pointsMm: points }) } as Item;
  const result = edited(item, shown);
  return result.ok ? result : { ...result, shown };
}

/** The corner does not snap to the item that it belongs to: its own old edges would hold it. */
function cornerSpot(item: Item, press: Press, view: View): [number, number] {
  const at = { xMm: press.xMm, yMm: press.yMm };
  const box = { minXMm: at.xMm, minYMm: at.yMm, maxXMm: at.xMm, maxYMm: at.yMm };
  const { xMm, yMm } = view.snap(at, press, { at, box, itemIds: new Set([item.id]) });
  const [x, y] = floorToItem(item, [xMm, yMm]);
  return [tidy(x), tidy(y)];
}

function withCorner(item: Item, grip: Extract<Grip, { kind: 'corner' | 'side' }>, spot: [number, number]): Gripped {
  const points = pointsOf(item);
  if (!points) return { ok: true, value: item };
  if (grip.kind === 'side') {
    return withPoints(item, [...points.slice(0, grip.index + 1), spot, ...points.slice(grip.index + 1)]);
  }
  const isRectangle = 'outlineMm' in item && rectangleOf(item) !== null;
  return withPoints(
    item,
    isRectangle ? resized(points, grip.index, spot) : points.map((point, at) => (at === grip.index ? spot : point)),
  );
}

/** A rectangle with one corner elsewhere; the opposite corner stays. */
function resized(points: Points, index: number, [x, y]: [number, number]): Points {
  const [stayX, stayY] = points[(index + 2) % 4];
  return cornersOf({
    minX: Math.min(x, stayX),
    minY: Math.min(y, stayY),
    maxX: Math.max(x, stayX),
    maxY: Math.max(y, stayY),
  });
}

function withEnd(item: Item, end: 'from' | 'to', press: Press, view: View): Gripped {
  if (item.kind === 'dimension') {
    const settled = settledDimension(item, (id) => view.items.get(id));
    const mark = press.alt ? null : markUnder(view.items, press);
    const spot = view.snap(press, press);
    const atMm: PointMm = mark?.atMm ?? [spot.xMm, spot.yMm];
    const [x, y] = floorToItem(item, atMm);
    const own: [number, number] = [tidy(x), tidy(y)];
    const points = end === 'from' ? { fromMm: own, toMm: settled.toMm } : { fromMm: settled.fromMm, toMm: own };
    return edited(item, { ...points, ...attachment(end, { atMm, item: mark?.item }) });
  }
  if (item.kind !== 'sectionLine') return { ok: true, value: item };
  const spot = cornerSpot(item, press, view);
  return edited(item, end === 'from' ? { fromMm: spot } : { toMm: spot });
}

function withOffset(item: Item, press: Press, view: View): Gripped {
  if (item.kind !== 'dimension') return { ok: true, value: item };
  const { fromMm, toMm } = settledDimension(item, (id) => view.items.get(id));
  const [x, y] = floorToItem(item, [press.xMm, press.yMm]);
  const length = Math.hypot(toMm[0] - fromMm[0], toMm[1] - fromMm[1]) || 1;
  const left = ((toMm[0] - fromMm[0]) * (y - fromMm[1]) - (toMm[1] - fromMm[1]) * (x - fromMm[0])) / length;
  const grid = press.alt ? null : view.snapping.gridMm;
  return edited(item, { offsetMm: tidy(grid ? Math.round(left / grid) * grid : left) });
}

function withAim(
  fixture: Fixture,
  grip: Extract<Grip, { kind: 'aim' | 'roll' }>,
  press: Press,
  { snapping }: View,
): Gripped {
  const point = pointOf(fixture, grip.taskPointId);
  if (!point) return { ok: true, value: fixture };
  const [x, y] = floorToItem(fixture, [press.xMm, press.yMm]);
  const [dx, dy] = [x - point.xMm, y - point.yMm];
  if (grip.kind === 'roll') {
    const towards = rollTowards(point, Math.atan2(dy, dx));
    if (towards === null) return { ok: true, value: fixture };
    return editedTaskPoint(fixture, point.id, { rollDeg: snapAngle(towards, snapping, press.alt) });
  }
  const { tiltDeg, azimuthDeg } = aimTowards(dx, dy, grip.pxMm);
  return editedTaskPoint(fixture, point.id, {
    tiltDeg: Math.min(Math.abs(snapAngle(tiltDeg, snapping, press.alt)), 180),
    azimuthDeg: snapAngle(azimuthDeg, snapping, press.alt),
  });
}
