import type { Transaction } from 'sequelize';
import type { Study } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict } from '../errors';
import { demandRole, type Actor } from '../policy';
import { isOver, lockStudy } from './data';

/**
 * Stops a study. Slices still queued find it cancelled and do nothing; one being computed is refused when it comes.
 * @throws 404, 409 `study_finished` where the answer is already there.
 */
export async function cancelStudy(actor: Actor, studyId: string, outer?: Transaction): Promise<Study> {
  demandRole(actor, 'planner');
  return inTransaction(async (transaction) => {
    const study = await lockStudy(actor, studyId, transaction);
    if (study.state === 'done')
      throw conflict('study_finished', 'This study is finished already; there is nothing to cancel.');
    if (!isOver(study)) {
      await study.update({ state: 'cancelled', finishedAt: new Date() }, { transaction });
      await recordAudit(actor, { action: 'study.cancelled', subjectId: studyId }, transaction);
    }
    return study;
  }, outer);
}
