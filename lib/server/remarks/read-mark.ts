import { RemarkRead } from '@/models';
import { inTransaction } from '../database';
import type { MemberActor } from '../policy';
import { findRemark } from './data';

/** Notes that the member has read the remark as it is now. */
export async function markRead(actor: MemberActor, remarkId: string): Promise<void> {
  await inTransaction(async (transaction) => {
    await findRemark(actor, remarkId, transaction);
    await RemarkRead.upsert({ remarkId, userId: actor.userId, readAt: new Date() }, { transaction });
  });
}
