import type { Transaction } from 'sequelize';
import { LayoutItem, type Layout } from '@/models';
import type { Item } from '@/lib/layout/items';
import type { StoredItem } from '@/lib/layout/operations';

/** The part of a sheet that a batch is about. */
export interface HeldItems {
  readonly items: StoredItem[];
  readonly removedVersions: Map<string, number>;
}

export async function holdItems(
  layout: Layout,
  itemIds: readonly string[],
  transaction: Transaction,
): Promise<HeldItems> {
  const rows = await LayoutItem.findAll({
    where: { layoutId: layout.id, id: [...itemIds] },
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  return {
    items: rows.filter(({ removedAt }) => !removedAt).map(({ version, data }) => ({ version, item: data })),
    removedVersions: new Map(rows.filter(({ removedAt }) => removedAt).map(({ id, version }) => [id, version])),
  };
}

/** The first items of a layout that has none yet, at version 1. */
export async function layItems(layoutId: string, items: readonly Item[], transaction: Transaction): Promise<void> {
  // One behind another in time: items without a place in the list stand there as they came.
  const startMs = Date.now();
  await LayoutItem.bulkCreate(
    items.map((item, index) => ({
      layoutId,
      id: item.id,
      version: 1,
      kind: item.kind,
      data: item,
      layoutVersion: 0,
      createdAt: new Date(startMs + index),
    })),
    { transaction },
  );
}

/** Writes what became of the items touched, under the layout's new version; those not in `after` become tombstones. */
export async function storeItems(
  layout: Layout,
  itemIds: readonly string[],
  after: readonly StoredItem[],
  transaction: Transaction,
): Promise<void> {
  const standing = new Map(after.map((entry) => [entry.item.id, entry]));
  const puts = itemIds.flatMap((id) => standing.get(id) ?? []);
  const removed = itemIds.filter((id) => !standing.has(id));
  const layoutVersion = layout.version;

  // One behind another in time: items without a place in the list stand there as they were sent.
  const startMs = Date.now();
  await LayoutItem.bulkCreate(
    puts.map(({ version, item }, index) => ({
      layoutId: layout.id,
      id: item.id,
      version,
      kind: item.kind,
      data: item,
      layoutVersion,
      removedAt: null,
      createdAt: new Date(startMs + index),
    })),
    {
      conflictAttributes: ['layoutId', 'id'],
      updateOnDuplicate: ['version', 'kind', 'data', 'layoutVersion', 'removedAt', 'updatedAt'],
      transaction,
    },
  );
  await LayoutItem.update(
    { removedAt: new Date(), layoutVersion },
    { where: { layoutId: layout.id, id: removed }, transaction },
  );
}

export async function countItems(layout: Layout, transaction: Transaction): Promise<number> {
  return LayoutItem.count({ where: { layoutId: layout.id, removedAt: null }, transaction });
}
