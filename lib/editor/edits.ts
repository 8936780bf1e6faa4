import { detached, isAttached, settledDimension } from '@/lib/layout/attached-dimensions';
import { withFreshIds } from '@/lib/layout/fresh-ids';
import { itemFault } from '@/lib/layout/item-fault';
import { itemSchema, type Fixture, type Item, type TaskPoint } from '@/lib/layout/items';
import { put, remove, type Change, type Items } from './changes';
import { freeName, kindWords } from './make-items';
import { lastPlace } from './order';
import { normalAngle, tidy } from './snapping';

/** What a typed value did: the item with it, or what is wrong with it and what to do. */
export type Edit<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly message: string };

const MESSAGES: Record<string, string> = {
  too_big: 'That is farther than a sheet goes. Write a smaller value.',
  too_small: 'That is too small. Write a larger value.',
  invalid_type: 'That is no number. Write digits, with a point for the fraction.',
};

/** An item with some fields set anew. Refused where the document would not be valid; the item given stays as it was. */
export function edited<T extends Item>(item: T, patch: Partial<T>): Edit<T> {
  const checked = itemSchema.safeParse({ ...item, ...patch });
  if (!checked.success) {
    const [issue] = checked.error.issues;
    // Words of our own stand; those that the schema library made up speak of types.
    const own = !/^(Too|Invalid|Expected|Unrecognized)\b/.test(issue.message);
    return { ok: false, message: own ? issue.message : (MESSAGES[issue.code] ?? issue.message) };
  }
  const fault = itemFault(checked.data);
  // Parsing keeps the kind, so what comes out is what went in.
  return fault ? { ok: false, message: fault } : { ok: true, value: checked.data as T };
}

export function editedTaskPoint(fixture: Fixture, taskPointId: string, patch: Partial<TaskPoint>): Edit<Fixture> {
  const taskPoints = fixture.taskPoints.map((point) => (point.id === taskPointId ? { ...point, ...patch } : point));
  return edited(fixture, { taskPoints });
}

export function withoutTaskPoint(fixture: Fixture, taskPointId: string): Fixture {
  return { ...fixture, taskPoints: fixture.taskPoints.filter(({ id }) => id !== taskPointId) };
}

/** Moves a task point up or down in the order of the work. */
export function reorderedTaskPoint(fixture: Fixture, taskPointId: string, by: -1 | 1): Fixture {
  const points = [...fixture.taskPoints].sort((one, other) => one.order - other.order);
  const from = points.findIndex(({ id }) => id === taskPointId);
  const to = from + by;
  if (from < 0 || to < 0 || to >= points.length) return fixture;
  const [moved] = points.splice(from, 1);
  points.splice(to, 0, moved);
  return { ...fixture, taskPoints: points.map((point, order) => ({ ...point, order })) };
}

const movable = (items: Items, ids: readonly string[]): Item[] =>
  ids.map((id) => items.get(id)).filter((item): item is Item => item !== undefined && !item.locked);

/** Shifts items; locked ones stay. */
export function moved(items: Items, ids: readonly string[], byXMm: number, byYMm: number): Change[] {
  return movable(items, ids).map((item) =>
    put(items, { ...item, xMm: tidy(item.xMm + byXMm), yMm: tidy(item.yMm + byYMm) }),
  );
}

/** Turns items counter-clockwise, each about its own place; locked ones stay. */
export function turnedBy(items: Items, ids: readonly string[], byDeg: number): Change[] {
  return movable(items, ids).map((item) => put(items, { ...item, angleDeg: normalAngle(item.angleDeg + byDeg) }));
}

/** Takes items away; locked ones stay. Dimensions that followed one of them stay where they stand. */
export function removed(items: Items, ids: readonly string[]): Change[] {
  const gone = new Set(movable(items, ids).map(({ id }) => id));
  const left = [...items.values()].filter((item) => isAttached(item) && !gone.has(item.id)).filter(isAttached);
  const released = left.map((dimension) =>
    detached(
      dimension,
      (id) => gone.has(id),
      (id) => items.get(id),
    ),
  );
  return [
    ...[...gone].map((id) => remove(items, id)),
    ...released.flatMap((dimension) => (dimension ? [put(items, dimension)] : [])),
  ];
}

/** Locks, unlocks, hides or shows items; locked ones too. */
export function flagged(
  items: Items,
  ids: readonly string[],
  flags: Partial<Pick<Item, 'locked' | 'hidden'>>,
): Change[] {
  const found = ids.map((id) => items.get(id)).filter((item): item is Item => item !== undefined);
  return found.map((item) => put(items, { ...item, ...flags }));
}

/** Copies beside the originals, with names and ids of their own; what was a group among them is a group of its own. */
export function duplicated(
  items: Items,
  ids: readonly string[],
  byMm: number,
  newId: () => string,
): { changes: Change[]; copies: string[] } {
  const changes: Change[] = [];
  const now = new Map(items);
  const originals = ids.map((id) => items.get(id)).filter((item): item is Item => item !== undefined);
  for (const fresh of withFreshIds(onTheirOwn(originals, items), newId)) {
    const copy: Item = {
      ...fresh,
      name: freeName(now, fresh.kind, kindWords(fresh)),
      xMm: fresh.xMm + byMm,
      yMm: fresh.yMm - byMm,
      order: lastPlace(now),
      locked: false,
    };
    now.set(copy.id, copy);
    changes.push({ itemId: copy.id, before: null, after: copy });
  }
  return { changes, copies: changes.map(({ itemId }) => itemId) };
}

/** Items as they stand now, the dimensions among them holding on to nothing outside: a copy does not follow its original's items. */
export function onTheirOwn(chosen: readonly Item[], items: Items): Item[] {
  const together = new Set(chosen.map(({ id }) => id));
  const itemOf = (id: string) => items.get(id);
  return chosen.map((item) => {
    if (!isAttached(item)) return item;
    return detached(item, (id) => !together.has(id), itemOf) ?? settledDimension(item, itemOf);
  });
}
