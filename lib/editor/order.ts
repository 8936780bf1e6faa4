import type { Item } from '@/lib/layout/items';
import { put, type Change, type Items } from './changes';

const placeOf = (item: Item) => item.order ?? 0;

/** The items from first to last on the list, which is from bottom to top on the sheet. Ties keep the order they came in. */
export function inOrder(items: Items): Item[] {
  return [...items.values()].sort((one, other) => placeOf(one) - placeOf(other));
}

/** The place behind the last item. */
export function lastPlace(items: Items): number {
  let last = 0;
  for (const item of items.values()) last = Math.max(last, placeOf(item));
  return last + 1;
}

/**
 * Moves an item up (−1) or down (+1) the list. Usually one item changes: it takes the place midway between its new
 * neighbours. Where there is no room between them the whole list is numbered afresh.
 */
export function reorder(items: Items, itemId: string, by: -1 | 1): Change[] {
  const list = inOrder(items);
  const from = list.findIndex((item) => item.id === itemId);
  const to = from + by;
  if (from < 0 || to < 0 || to >= list.length) return [];
  const [moved] = list.splice(from, 1);
  list.splice(to, 0, moved);
  const before = to > 0 ? placeOf(list[to - 1]) : placeOf(list[to + 1]) - 2;
  const after = to < list.length - 1 ? placeOf(list[to + 1]) : before + 2;
  const middle = (before + after) / 2;
  const hasRoom = middle - before > 1e-6 && after - middle > 1e-6;
  if (hasRoom) return [put(items, { ...moved, order: middle })];
  return list.map((item, index) => put(items, { ...item, order: index + 1 }));
}
