import type { Transaction } from 'sequelize';
import { Remark } from '@/models';
import type { Remark as RemarkAnswer } from '@/lib/contracts/remarks';
import { inTransaction } from '../database';
import type { MemberActor } from '../policy';
import { findRemark } from './data';
import { presentRemark } from './present';

/** Settles a remark or reopens it; one settled twice keeps its first date. */
export async function resolveRemark(
  actor: MemberActor,
  remarkId: string,
  { resolved }: { resolved: boolean },
  outer?: Transaction,
): Promise<RemarkAnswer> {
  return inTransaction(async (transaction) => {
    await findRemark(actor, remarkId, transaction);
    if (resolved) {
      await Remark.update(
        { resolvedAt: new Date(), resolvedBy: actor.userId },
        { where: { id: remarkId, resolvedAt: null }, transaction },
      );
    } else {
      await Remark.update({ resolvedAt: null, resolvedBy: null }, { where: { id: remarkId }, transaction });
    }
    return presentRemark(await findRemark(actor, remarkId, transaction), { actor });
  }, outer);
}
