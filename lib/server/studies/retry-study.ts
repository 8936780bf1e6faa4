import type { Transaction } from 'sequelize';
import type { Study } from '@/models';
import { inTransaction } from '../database';
import { conflict } from '../errors';
import { demandRole, type Actor } from '../policy';
import { isOver, lockStudy } from './data';
import { isOfThisVersion, storedInputSchema } from './question';
import { startAttempt } from './start-attempt';

/**
 * Starts a failed or cancelled study again; one that is under way or done is answered as it is.
 * @throws 404, 409 `study_outdated` where the computation has changed since it was asked.
 */
export async function retryStudy(actor: Actor, studyId: string, outer?: Transaction): Promise<Study> {
  demandRole(actor, 'planner');
  return inTransaction(async (transaction) => {
    const study = await lockStudy(actor, studyId, transaction);
    if (!isOver(study)) return study;
    const input = storedInputSchema.safeParse(study.input);
    // Its key names the old computation, so the new one's answer must not be stored under it.
    if (!input.success || !isOfThisVersion(input.data)) {
      throw conflict('study_outdated', 'The computation has changed since this study was asked. Ask for it again.');
    }
    await startAttempt(actor, study, input.data, transaction);
    return study;
  }, outer);
}
