import { same } from './same';

/**
 * Answers what it was given before, wherever that says the same: what is drawn from it then stays as it is. An element of a list that
 * stayed equal is the same object too.
 */
export function keepSame<T>(): (next: T) => T {
  let held: { readonly value: T } | null = null;
  return (next) => {
    const value = held === null ? next : shared(held.value, next);
    held = { value };
    return value;
  };
}

function shared<T>(before: T, next: T): T {
  if (same(before, next)) return before;
  if (!Array.isArray(before) || !Array.isArray(next)) return next;
  // Elements keep their kind; only their identity is exchanged.
  return next.map((entry: unknown, index) => (same(before[index], entry) ? (before[index] as unknown) : entry)) as T;
}

/** The same for maps of plain values. */
export function keepSameMap<Key, Value>(): (next: ReadonlyMap<Key, Value>) => ReadonlyMap<Key, Value> {
  let held: ReadonlyMap<Key, Value> = new Map();
  return (next) => {
    const isSame =
      held.size === next.size && [...next].every(([key, value]) => held.has(key) && same(held.get(key), value));
    if (!isSame) held = next;
    return held;
  };
}
