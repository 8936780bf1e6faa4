import type { Item } from '@/lib/layout/items';
import { same } from './same';

/** The items of a sheet as one person sees them now, by id, in the order they came. */
export type Items = ReadonlyMap<string, Item>;

/** What happened to one item. `before` is null for a new one, `after` for a removed one. */
export interface Change {
  readonly itemId: string;
  readonly before: Item | null;
  readonly after: Item | null;
}

export function put(items: Items, item: Item): Change {
  return { itemId: item.id, before: items.get(item.id) ?? null, after: item };
}

export function remove(items: Items, itemId: string): Change {
  return { itemId, before: items.get(itemId) ?? null, after: null };
}

/** True where the change leaves the item as it was. */
export function isIdle(change: Change): boolean {
  return same(change.before, change.after);
}

export function invert(changes: readonly Change[]): Change[] {
  return changes.map(({ itemId, before, after }) => ({ itemId, before: after, after: before })).reverse();
}

export function applyChanges(items: Items, changes: readonly Change[]): Items {
  if (changes.length === 0) return items;
  const next = new Map(items);
  for (const { itemId, after } of changes) {
    if (after) next.set(itemId, after);
    else next.delete(itemId);
  }
  return next;
}

/**
 * Replays changes on a sheet that others may have edited since: only the fields that the change touched are set, so undoing
 * a move keeps a colleague's new name. A change to an item that is gone is dropped; a removal of it likewise.
 */
export function rebase(items: Items, changes: readonly Change[]): Change[] {
  const now = new Map(items);
  const rebased: Change[] = [];
  for (const change of changes) {
    const current = now.get(change.itemId) ?? null;
    const after = rebaseOne(current, change);
    if (after === undefined) continue;
    const next = { itemId: change.itemId, before: current, after };
    if (isIdle(next)) continue;
    rebased.push(next);
    if (after) now.set(change.itemId, after);
    else now.delete(change.itemId);
  }
  return rebased;
}

function rebaseOne(current: Item | null, { before, after }: Change): Item | null | undefined {
  if (!after) return current ? null : undefined;
  if (!before) return current ?? after;
  if (!current) return undefined;
  if (current === before) return after;
  const patch: Record<string, unknown> = {};
  for (const key of new Set([...Object.keys(before), ...Object.keys(after)])) {
    const [was, becomes] = [before[key as keyof Item], after[key as keyof Item]];
    if (!same(was, becomes)) patch[key] = becomes;
  }
  // The kind of an item never changes, so the fields of `after` are fields of `current`.
  return { ...current, ...patch } as Item;
}
