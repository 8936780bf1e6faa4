import type { ArmChange, LibraryArm } from '@/lib/contracts/arms';
import { Arm } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import type { Transaction } from '../database';
import { demandRole } from '../policy';
import type { Actor } from '../policy';
import { getArm, holdNewest } from './data';

/** Archives an arm with all its versions, or brings it back. An arm archived twice keeps its first date. */
export async function changeArm(
  actor: Actor,
  armId: string,
  { archived }: ArmChange,
  outer?: Transaction,
): Promise<LibraryArm> {
  demandRole(actor, 'integrator');
  return inTransaction(async (transaction) => {
    const { id, familyId, name, archivedAt } = await holdNewest(actor, armId, transaction);
    if (archived !== Boolean(archivedAt)) {
      const where = { organisationId: actor.organisationId, familyId };
      await Arm.update({ archivedAt: archived ? new Date() : null }, { where, transaction });
      const action = archived ? 'arm.archived' : 'arm.brought_back';
      await recordAudit(actor, { action, subjectId: id, details: { name } }, transaction);
    }
    return getArm(actor, armId, transaction);
  }, outer);
}
