import type { Transaction } from 'sequelize';
import { RemarkReply } from '@/models';
import type { Remark as RemarkAnswer } from '@/lib/contracts/remarks';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { authorColumns, demandMayRemark, readerOf, type Writer } from './author';
import { findRemark } from './data';
import { keepMentions } from './mentions';
import { notifyNamed, notifyOtherSide } from './notify';
import { presentRemark } from './present';

/** Answers a remark and tells the other side of it. A settled remark stays settled: whoever settled it reopens it. */
export async function postReply(
  writer: Writer,
  remarkId: string,
  { body, mentions = [] }: { body: string; mentions?: string[] },
  outer?: Transaction,
): Promise<RemarkAnswer> {
  demandMayRemark(writer);
  return inTransaction(async (transaction) => {
    await findRemark(writer.actor, remarkId, transaction);
    const reply = await RemarkReply.create({ remarkId, body, ...authorColumns(writer) }, { transaction });
    const named = await keepMentions(writer, { remarkId, replyId: reply.id }, mentions, transaction);
    const remark = await findRemark(writer.actor, remarkId, transaction);
    await notifyNamed(named, remark, { writer, body }, transaction);
    await notifyOtherSide('reply', remark, { writer, body, told: named }, transaction);
    await recordAudit(writer.actor, { action: 'remark.answered', subjectId: remarkId }, transaction);
    return presentRemark(remark, readerOf(writer));
  }, outer);
}
