import type { LayoutChanges, Operation, OperationBatch, OperationResult, StoredItem } from '@/lib/contracts/layouts';
import type { Item } from '@/lib/layout/items';
import { operationItemId } from '@/lib/layout/operations';
import type { Items } from './changes';
import { same } from './same';

/** Two people changed one item: mine is on the sheet, theirs on the server. Null: they removed it. */
export interface Conflict {
  readonly itemId: string;
  readonly theirs: StoredItem | null;
}

/**
 * What the server is known to hold. An edit that waits to be saved is simply a difference between the sheet and this, so
 * nothing can be forgotten and an edit taken back costs no request.
 */
export interface Sync {
  /**
   * Others' changes are known up to this version of the layout. An answer to our own batch does not move it on: somebody
   * else's batch may have come in before ours.
   */
  readonly layoutVersion: number;
  readonly stored: ReadonlyMap<string, StoredItem>;
  /** Sent and not answered. It stays until the server answers, and is sent again under the same id. */
  readonly inFlight: OperationBatch | null;
  readonly conflicts: readonly Conflict[];
  /** Counts what was sent and answered, so that an answer to an older question can be told and dropped. */
  readonly exchanges: number;
}

export function syncedWith(layoutVersion: number, items: readonly StoredItem[]): Sync {
  const stored = new Map(items.map((entry) => [entry.item.id, entry]));
  return { layoutVersion, stored, inFlight: null, conflicts: [], exchanges: 0 };
}

/** What one request may carry; the contract allows no more. */
const BATCH_LIMIT = 1000;

/** The operations that would make the server's items those of the sheet; items in conflict wait for a decision. */
export function differences(sync: Sync, items: Items): Operation[] {
  const undecided = new Set(sync.conflicts.map(({ itemId }) => itemId));
  const operations: Operation[] = [];
  for (const [itemId, item] of items) {
    const stored = sync.stored.get(itemId);
    if (undecided.has(itemId) || (stored && same(stored.item, item))) continue;
    operations.push({ type: 'put', baseVersion: stored?.version ?? 0, item });
  }
  for (const [itemId, { version }] of sync.stored) {
    if (!items.has(itemId) && !undecided.has(itemId)) operations.push({ type: 'remove', baseVersion: version, itemId });
  }
  return operations;
}

/**
 * Lays edits that an earlier visit could not save over the sheet as loaded. Where the server is newer than what an edit was
 * made on, the two stand as a conflict.
 */
export function restored(exchange: Exchange, edits: readonly Operation[]): Exchange {
  const items = new Map(exchange.items);
  const conflicts = [...exchange.sync.conflicts];
  for (const edit of edits) {
    const itemId = operationItemId(edit);
    const theirs = exchange.sync.stored.get(itemId) ?? null;
    const mine = edit.type === 'put' ? edit.item : null;
    if (mine) items.set(itemId, mine);
    else items.delete(itemId);
    if ((theirs?.version ?? 0) !== edit.baseVersion && !same(mine, theirs?.item ?? null)) {
      conflicts.push({ itemId, theirs });
    }
  }
  return { sync: { ...exchange.sync, conflicts }, items };
}

/**
 * Everything that waits on this sheet beyond the batch in flight, which is taken as applied: what a reload must bring back
 * once that batch is settled.
 */
export function waiting(sync: Sync, items: Items): Operation[] {
  const stored = new Map(sync.stored);
  for (const operation of sync.inFlight?.operations ?? []) {
    if (operation.type === 'put')
      stored.set(operation.item.id, { version: operation.baseVersion + 1, item: operation.item });
    else stored.delete(operation.itemId);
  }
  return differences({ ...sync, stored, conflicts: [] }, items);
}

/** Server and sheet after an exchange. */
export interface Exchange {
  readonly sync: Sync;
  readonly items: Items;
}

/** The next batch on its way: at most `BATCH_LIMIT` of the differences; null with nothing to send or one still under way. */
export function departing(sync: Sync, items: Items, batchId: string): Sync | null {
  if (sync.inFlight) return null;
  const operations = differences(sync, items).slice(0, BATCH_LIMIT);
  if (operations.length === 0) return null;
  return { ...sync, inFlight: { id: batchId, operations }, exchanges: sync.exchanges + 1 };
}

/** The server took the batch that is in flight. Edits made meanwhile stay differences, now on the new versions. */
export function acknowledged(sync: Sync, result: OperationResult): Sync {
  const stored = new Map(sync.stored);
  const versions = new Map(result.items.map(({ id, version }) => [id, version]));
  for (const operation of sync.inFlight?.operations ?? []) {
    if (operation.type === 'remove') {
      stored.delete(operation.itemId);
      continue;
    }
    const version = versions.get(operation.item.id) ?? operation.baseVersion + 1;
    stored.set(operation.item.id, { version, item: operation.item });
  }
  return { ...sync, stored, inFlight: null, exchanges: sync.exchanges + 1 };
}

/** The server applied nothing of the batch because some items are newer there. The others go again in the next batch. */
export function refusedAsStale(
  { sync, items }: Exchange,
  stale: readonly { itemId: string; current: StoredItem | null }[],
): Exchange {
  return stale.reduce<Exchange>((exchange, { itemId, current }) => meet(exchange, itemId, current), {
    sync: { ...sync, inFlight: null, exchanges: sync.exchanges + 1 },
    items,
  });
}

/** Takes in what others changed. Only to be called with no batch in flight: an answer under way could be older than it. */
export function merged(exchange: Exchange, changes: LayoutChanges): Exchange {
  let next = exchange;
  for (const entry of changes.items) next = meet(next, entry.item.id, entry);
  for (const itemId of changes.removed) next = meet(next, itemId, null);
  const layoutVersion = Math.max(next.sync.layoutVersion, changes.layoutVersion);
  return layoutVersion === next.sync.layoutVersion ? next : { ...next, sync: { ...next.sync, layoutVersion } };
}

/** One item as the server holds it now: taken over where nothing of ours waits, a conflict where something does. */
function meet(exchange: Exchange, itemId: string, theirs: StoredItem | null): Exchange {
  const { sync, items } = exchange;
  const known = sync.stored.get(itemId) ?? null;
  const undecided = sync.conflicts.some((conflict) => conflict.itemId === itemId);
  if (!undecided && theirs?.version === known?.version) return exchange;
  const mine = items.get(itemId) ?? null;
  const untouched = !undecided && same(mine, known?.item ?? null);
  if (untouched || same(mine, theirs?.item ?? null)) {
    return settle(exchange, itemId, theirs, theirs?.item ?? null);
  }
  const conflicts = [...sync.conflicts.filter((conflict) => conflict.itemId !== itemId), { itemId, theirs }];
  return { sync: { ...sync, conflicts }, items };
}

/** Decides a conflict. Mine stays a difference and goes out on their version; theirs replaces mine on the sheet. */
export function decided(exchange: Exchange, itemId: string, choice: 'mine' | 'theirs'): Exchange {
  const conflict = exchange.sync.conflicts.find((entry) => entry.itemId === itemId);
  if (!conflict) return exchange;
  const mine = exchange.items.get(itemId) ?? null;
  return settle(exchange, itemId, conflict.theirs, choice === 'mine' ? mine : (conflict.theirs?.item ?? null));
}

function settle({ sync, items }: Exchange, itemId: string, theirs: StoredItem | null, item: Item | null): Exchange {
  const stored = new Map(sync.stored);
  if (theirs) stored.set(itemId, theirs);
  else stored.delete(itemId);
  const conflicts = sync.conflicts.filter((conflict) => conflict.itemId !== itemId);
  const nextItems = new Map(items);
  if (item) nextItems.set(itemId, item);
  else nextItems.delete(itemId);
  return { sync: { ...sync, stored, conflicts }, items: nextItems };
}
