import type { Item } from './items';

type Plain = null | boolean | number | string | undefined | readonly Plain[] | { readonly [key: string]: Plain };

/**
 * The same items with ids of their own: every id that one of them carries is replaced, in the item, its group, its parts and
 * wherever another of them points to it. What points outside of them keeps pointing there.
 */
export function withFreshIds(items: readonly Item[], newId: () => string): Item[] {
  const fresh = new Map<string, string>();
  for (const item of items) {
    collect(item as unknown as Plain, (id) => fresh.has(id) || fresh.set(id, newId()));
    if (item.groupId && !fresh.has(item.groupId)) fresh.set(item.groupId, newId());
  }
  // Only strings were exchanged, so the documents keep their shape.
  return items.map((item) => exchanged(item as unknown as Plain, fresh) as unknown as Item);
}

function collect(value: Plain, take: (id: string) => void): void {
  if (typeof value !== 'object' || value === null) return;
  if (Array.isArray(value)) return value.forEach((entry: Plain) => collect(entry, take));
  for (const [key, entry] of Object.entries(value)) {
    if (key === 'id' && typeof entry === 'string') take(entry);
    else collect(entry, take);
  }
}

function exchanged(value: Plain, fresh: ReadonlyMap<string, string>): Plain {
  if (typeof value === 'string') return fresh.get(value) ?? value;
  if (typeof value !== 'object' || value === null) return value;
  if (Array.isArray(value)) return value.map((entry: Plain) => exchanged(entry, fresh));
  return Object.fromEntries(Object.entries(value).map(([key, entry]) => [key, exchanged(entry, fresh)]));
}

/** Fields that name another thing of the sheet, and what becomes of them where it is not there. */
const WITHOUT_IT: Record<string, 'null' | 'absent' | 'drop'> = {
  robotId: 'null',
  fromItemId: 'absent',
  toItemId: 'absent',
  // A step of a sequence without its point or zone is no step.
  fixtureId: 'drop',
  taskPointId: 'drop',
  zoneId: 'drop',
};

/** An item that points only to what `isThere` knows: other references are emptied, and list entries that need one are left out. */
export function withoutStrangers(item: Item, isThere: (id: string) => boolean): Item {
  return pruned(item as unknown as Plain, isThere) as unknown as Item;
}

const DROPPED = Symbol('dropped');

function pruned(value: Plain, isThere: (id: string) => boolean): Plain | typeof DROPPED {
  if (typeof value !== 'object' || value === null) return value;
  if (Array.isArray(value)) {
    const kept = value.map((entry: Plain) => pruned(entry, isThere)).filter((entry) => entry !== DROPPED);
    return kept as Plain[];
  }
  const own: Record<string, Plain> = {};
  for (const [key, entry] of Object.entries(value)) {
    const rule = WITHOUT_IT[key];
    if (!rule || typeof entry !== 'string' || isThere(entry)) {
      const inner = pruned(entry, isThere);
      if (inner !== DROPPED) own[key] = inner;
    } else if (rule === 'drop') return DROPPED;
    else if (rule === 'null') own[key] = null;
  }
  return own;
}
