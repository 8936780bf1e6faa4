import { isDeepStrictEqual } from 'node:util';
import type { Transaction } from 'sequelize';
import { Arm, LayoutOperation, type Layout } from '@/models';
import type { Operation, OperationBatch, OperationResult } from '@/lib/contracts/layouts';
import { applyOperations, operationItemId, type Conflict, type StoredItem } from '@/lib/layout/operations';
import { inTransaction } from '../database';
import { conflict, invalidFields, type AppError } from '../errors';
import type { MemberActor } from '../policy';
import { findLayout } from './data';
import { recordEditing } from './record-editing';
import { countItems, holdItems, storeItems } from './item-rows';

/** Keeps a sheet within what browsers draw and snapshots hold. */
const ITEMS_MAX = 5000;

/** The answer given the first time to a batch that was sent again, when its answer got lost on the way. */
async function earlierResult(
  layout: Layout,
  batch: OperationBatch,
  transaction: Transaction,
): Promise<OperationResult | null> {
  const earlier = await LayoutOperation.findOne({ where: { layoutId: layout.id, id: batch.id }, transaction });
  if (!earlier) return null;
  // Compared as the database keeps them: JSON knows no undefined members.
  const sent = JSON.parse(JSON.stringify(batch.operations)) as unknown;
  if (!isDeepStrictEqual(earlier.operations, sent)) {
    throw conflict('batch_reused', 'Another batch of edits was sent under this id. Send these edits under a new one.');
  }
  return earlier.result;
}

/** Robots may only be arms of the organisation's own library. */
async function checkArms(
  actor: MemberActor,
  operations: readonly Operation[],
  transaction: Transaction,
): Promise<void> {
  const named = operations.flatMap((operation, index) =>
    operation.type === 'put' && operation.item.kind === 'robot' ? [{ index, armId: operation.item.armId }] : [],
  );
  if (named.length === 0) return;
  const arms = await Arm.findAll({
    where: { id: [...new Set(named.map(({ armId }) => armId))], organisationId: actor.organisationId },
    attributes: ['id'],
    transaction,
  });
  const known = new Set(arms.map(({ id }) => id));
  const unknown = named.filter(({ armId }) => !known.has(armId));
  if (unknown.length === 0) return;
  throw invalidFields(
    unknown.map(({ index }) => ({
      path: `operations.${index}.item.armId`,
      message: 'This arm is not in your library. Choose another one.',
    })),
  );
}

function staleItems(conflicts: readonly Conflict[]): AppError {
  const detail =
    'Somebody else changed this in the meantime. Nothing of your change was stored; look at theirs and repeat it.';
  return conflict('stale_item', detail, { conflicts });
}

function sheetFull(): AppError {
  return conflict('sheet_full', 'A sheet holds at most 5,000 items. Remove some, or draw a second variant.');
}

/** New versions of the items put, in the order sent; an item removed again in the same batch is left out. */
function versionsPut(operations: readonly Operation[], after: readonly StoredItem[]): OperationResult['items'] {
  const versions = new Map(after.map(({ version, item }) => [item.id, version]));
  const ids = new Set(operations.flatMap((operation) => (operation.type === 'put' ? [operation.item.id] : [])));
  return [...ids].flatMap((id) => {
    const version = versions.get(id);
    return version === undefined ? [] : [{ id, version }];
  });
}

/**
 * Applies a batch of edits, all of it or nothing. Throws 409 `stale_item` with the newer items where an edit was made on an older
 * version, 422 for an arm that is not in the library.
 */
export async function editLayout(
  actor: MemberActor,
  layoutId: string,
  batch: OperationBatch,
  outer?: Transaction,
): Promise<OperationResult> {
  return inTransaction(async (transaction) => {
    // The lock on the layout puts batches in line; only then can it be told whether this one came before.
    const layout = await findLayout(actor, layoutId, transaction, { lock: true });
    const earlier = await earlierResult(layout, batch, transaction);
    if (earlier) return earlier;

    await checkArms(actor, batch.operations, transaction);
    const itemIds = [...new Set(batch.operations.map(operationItemId))];
    const sheet = await holdItems(layout, itemIds, transaction);
    const { items, conflicts } = applyOperations(sheet.items, batch.operations, sheet.removedVersions);
    if (conflicts.length > 0) throw staleItems(conflicts);

    await layout.update({ version: layout.version + 1 }, { transaction });
    await storeItems(layout, itemIds, items, transaction);
    if ((await countItems(layout, transaction)) > ITEMS_MAX) throw sheetFull();

    const result = { layoutVersion: layout.version, items: versionsPut(batch.operations, items) };
    await LayoutOperation.create(
      {
        layoutId: layout.id,
        id: batch.id,
        userId: actor.userId,
        layoutVersion: layout.version,
        operations: batch.operations,
        result,
      },
      { transaction },
    );
    await recordEditing(actor, layout, transaction);
    return result;
  }, outer);
}
