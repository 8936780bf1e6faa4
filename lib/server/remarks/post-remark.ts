import type { Transaction } from 'sequelize';
import { Layout, Remark } from '@/models';
import type { Remark as RemarkAnswer, RemarkRequest } from '@/lib/contracts/remarks';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { invalid } from '../errors';
import { findRevision } from '../revisions/data';
import { authorColumns, demandMayRemark, readerOf, type Writer } from './author';
import { findRemark } from './data';
import { keepMentions } from './mentions';
import { notifyNamed, notifyOtherSide } from './notify';
import { presentRemark } from './present';

async function nextNumber(layoutId: string, transaction: Transaction): Promise<number> {
  // Two who write at the same moment get two numbers: the layout is held until the row is there.
  await Layout.findByPk(layoutId, { attributes: ['id'], lock: transaction.LOCK.UPDATE, transaction });
  const last = await Remark.max<number | null, Remark>('number', { where: { layoutId }, transaction });
  return (last ?? 0) + 1;
}

/** Guests name nobody. */
type NewRemark = Omit<RemarkRequest, 'mentions'> & Partial<Pick<RemarkRequest, 'mentions'>>;

/** Pins a remark to a revision that the writer can see, and tells the other side of it. */
export async function postRemark(
  writer: Writer,
  revisionId: string,
  { xMm, yMm, itemId, body, mentions }: NewRemark,
  outer?: Transaction,
): Promise<RemarkAnswer> {
  demandMayRemark(writer);
  return inTransaction(async (transaction) => {
    const { layoutId, snapshot } = await findRevision(writer.actor, revisionId, transaction);
    if (itemId !== null && !snapshot.items.some(({ id }) => id === itemId)) {
      throw invalid('itemId', 'This item is not on the revision. Pin the remark to the floor instead.');
    }
    const number = await nextNumber(layoutId, transaction);
    const { id } = await Remark.create(
      { revisionId, layoutId, number, xMm, yMm, itemId, body, ...authorColumns(writer) },
      { transaction },
    );
    const named = await keepMentions(writer, { remarkId: id, replyId: null }, mentions ?? [], transaction);
    const remark = await findRemark(writer.actor, id, transaction);
    await notifyNamed(named, remark, { writer, body }, transaction);
    await notifyOtherSide('remark', remark, { writer, body, told: named }, transaction);
    await recordAudit(writer.actor, { action: 'remark.posted', subjectId: id, details: { revisionId } }, transaction);
    return presentRemark(remark, readerOf(writer));
  }, outer);
}
