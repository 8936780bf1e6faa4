import type { Item } from '@/lib/layout/items';
import { put, type Change, type Items } from './changes';

/** The ids with everything that belongs to a group of one of them, in the order given; hidden members come along. */
export function withGroups(items: Items, ids: readonly string[]): string[] {
  const groups = new Set(ids.map((id) => items.get(id)?.groupId).filter((groupId) => groupId !== undefined));
  if (groups.size === 0) return [...ids];
  const members = [...items.values()].filter(({ groupId }) => groupId !== undefined && groups.has(groupId));
  return [...new Set([...ids, ...members.map(({ id }) => id)])];
}

/** What is moved as one: each group once, and each item that belongs to none. */
export function units(items: readonly Item[]): Item[][] {
  const byUnit = new Map<string, Item[]>();
  for (const item of items) {
    const key = item.groupId ?? item.id;
    byUnit.set(key, [...(byUnit.get(key) ?? []), item]);
  }
  return [...byUnit.values()];
}

const there = (items: Items, ids: readonly string[]): Item[] =>
  ids.map((id) => items.get(id)).filter((item): item is Item => item !== undefined);

/** Makes one group of items; groups that they were in become part of it. Fewer than two make none. */
export function grouped(items: Items, ids: readonly string[], groupId: string): Change[] {
  const members = there(items, withGroups(items, ids));
  return members.length < 2 ? [] : members.map((item) => put(items, { ...item, groupId }));
}

/** Takes the groups of these items apart. */
export function ungrouped(items: Items, ids: readonly string[]): Change[] {
  return there(items, withGroups(items, ids))
    .filter(({ groupId }) => groupId !== undefined)
    .map((item) => put(items, { ...item, groupId: undefined }));
}
