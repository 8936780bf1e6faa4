import type { Item } from './items';

/** An item and the version that the next edit of it must name. */
export interface StoredItem {
  readonly version: number;
  readonly item: Item;
}

/** One small edit. `baseVersion` is the version it was made on; 0 for an item that is not on the sheet. */
export type Operation =
  | { readonly type: 'put'; readonly baseVersion: number; readonly item: Item }
  | { readonly type: 'remove'; readonly baseVersion: number; readonly itemId: string };

/** What stands in the way of an edit: the newer item, or null where it was removed. */
export interface Conflict {
  readonly itemId: string;
  readonly current: StoredItem | null;
}

export interface Applied {
  /** The sheet after the edits; the sheet as it was where anything conflicts. */
  readonly items: readonly StoredItem[];
  readonly conflicts: readonly Conflict[];
}

export const operationItemId = (operation: Operation): string =>
  operation.type === 'put' ? operation.item.id : operation.itemId;

/**
 * Applies a batch of edits to the items of a sheet, all of them or none.
 *
 * The first edit of an item in the batch must name the version it was made on; later ones of the same batch follow from it and
 * are not compared. `removedVersions` are the last versions of items once removed: one that comes back counts on from
 * there, so that an edit made before the removal can never pass for a fresh one.
 */
export function applyOperations(
  stored: readonly StoredItem[],
  operations: readonly Operation[],
  removedVersions: ReadonlyMap<string, number> = new Map(),
): Applied {
  const sheet = new Map(stored.map((entry) => [entry.item.id, entry]));
  const versions = new Map([...removedVersions, ...stored.map((entry) => [entry.item.id, entry.version] as const)]);
  const touched = new Set<string>();
  const conflicts: Conflict[] = [];

  for (const operation of operations) {
    const itemId = operationItemId(operation);
    const current = sheet.get(itemId) ?? null;
    if (!touched.has(itemId) && operation.baseVersion !== (current?.version ?? 0)) conflicts.push({ itemId, current });
    touched.add(itemId);
    const version = (versions.get(itemId) ?? 0) + 1;
    versions.set(itemId, version);
    if (operation.type === 'put') sheet.set(itemId, { version, item: operation.item });
    else sheet.delete(itemId);
  }
  return conflicts.length > 0 ? { items: stored, conflicts } : { items: [...sheet.values()], conflicts };
}
