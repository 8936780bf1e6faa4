import type { Transaction } from 'sequelize';
import { Remark } from '@/models';
import type { Remark as RemarkAnswer, RemarkChange } from '@/lib/contracts/remarks';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { invalid } from '../errors';
import type { MemberActor } from '../policy';
import { findRemark, type PlacedRemark } from './data';
import { notifyAssignee } from './notify';
import { peopleOf } from './people';
import { presentRemark } from './present';

async function settle(actor: MemberActor, remarkId: string, resolved: boolean, transaction: Transaction) {
  // One settled twice keeps its first date.
  const [values, which] = resolved
    ? [
        { resolvedAt: new Date(), resolvedBy: actor.userId },
        { id: remarkId, resolvedAt: null },
      ]
    : [{ resolvedAt: null, resolvedBy: null }, { id: remarkId }];
  await Remark.update(values, { where: which, transaction });
}

async function demandPlanner(actor: MemberActor, remark: PlacedRemark, userId: string, transaction: Transaction) {
  const people = await peopleOf(actor, remark.revision.layout.projectId, transaction);
  if (!people.some(({ id, side }) => id === userId && side === 'integrator')) {
    throw invalid('assigneeId', 'A remark can be given to those who plan in your organisation. Choose one of them.');
  }
}

/** Settles a remark or reopens it, gives it to a planner, sets its day; what is left out stays. The new planner gets a mail. */
export async function changeRemark(
  actor: MemberActor,
  remarkId: string,
  { resolved, assigneeId, dueOn }: RemarkChange,
  outer?: Transaction,
): Promise<RemarkAnswer> {
  return inTransaction(async (transaction) => {
    const before = await findRemark(actor, remarkId, transaction);
    if (resolved !== undefined) await settle(actor, remarkId, resolved, transaction);
    if (assigneeId) await demandPlanner(actor, before, assigneeId, transaction);
    if (assigneeId !== undefined || dueOn !== undefined) {
      const values = { ...(assigneeId !== undefined && { assigneeId }), ...(dueOn !== undefined && { dueOn }) };
      await Remark.update(values, { where: { id: remarkId }, transaction });
    }
    const remark = await findRemark(actor, remarkId, transaction);
    if (assigneeId && assigneeId !== before.assigneeId) await notifyAssignee(actor, remark, transaction);
    const details = { resolved, assigneeId, dueOn };
    await recordAudit(actor, { action: 'remark.changed', subjectId: remarkId, details }, transaction);
    return presentRemark(remark, { actor });
  }, outer);
}
