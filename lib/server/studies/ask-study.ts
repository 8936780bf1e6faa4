import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { StudyQuestion } from '@/lib/contracts/studies';
import { Study } from '@/models';
import { inTransaction } from '../database';
import { tooManyRequests } from '../errors';
import { demandRole, type Actor, type MemberActor } from '../policy';
import { isOver } from './data';
import { demandAffordable, storedInputOf, studyKey } from './question';
import { sliceCountOf } from './slicing';
import { startAttempt } from './start-attempt';

/** Studies that one organisation may have under way: the workers belong to all of them. */
const UNDER_WAY_LIMIT = 20;

/**
 * The stored study of a question, at once where it was ever answered. Otherwise its slices are queued, once however many
 * ask at the same moment; a study that failed or was cancelled is started again.
 * @throws 404 for an arm of somebody else, 422 for too much work, 429 with too many studies under way.
 */
export async function askStudy(actor: Actor, question: StudyQuestion, outer?: Transaction): Promise<Study> {
  demandRole(actor, 'planner');
  const input = await storedInputOf(actor, question, outer);
  demandAffordable(input);
  const where = { organisationId: actor.organisationId, key: studyKey(input) };
  const stored = await Study.findOne({ where, transaction: outer });
  if (stored && !isOver(stored)) return stored;

  return inTransaction(async (transaction) => {
    if (!stored) {
      const row = { id: randomUUID(), ...where, input, sliceCount: sliceCountOf(input), askedBy: actor.userId };
      await Study.bulkCreate([row], { ignoreDuplicates: true, transaction });
    }
    // Whoever comes second waits here until the first has committed, and then finds the slices queued.
    const study = await Study.findOne({ where, lock: transaction.LOCK.UPDATE, transaction, rejectOnEmpty: true });
    if (study.attempt === 0 || isOver(study)) {
      await demandRoom(actor, transaction);
      await startAttempt(actor, study, input, transaction);
    }
    return study;
  }, outer);
}

async function demandRoom(actor: MemberActor, transaction: Transaction): Promise<void> {
  const where = { organisationId: actor.organisationId, state: ['queued', 'running'] };
  // The study about to start is one of them.
  if ((await Study.count({ where, transaction })) <= UNDER_WAY_LIMIT) return;
  throw tooManyRequests(
    `${UNDER_WAY_LIMIT} studies of your organisation are under way already. Wait for one to finish, or cancel one.`,
    10,
  );
}
