import type { Transaction } from 'sequelize';
import { StudySlice, type Study } from '@/models';
import { recordAudit } from '../audit';
import { studySliceJob } from '../jobs';
import type { MemberActor } from '../policy';
import { enqueueAll } from '../queue';
import type { StoredInput } from './question';
import { secondsPerSlice } from './slicing';

/** How much longer than on an idle core a slice may take before its worker counts as lost. */
const SLACK = 10;

/**
 * Queues every slice of a locked study under the next attempt number. What an earlier attempt left is dropped, and what it
 * may still be computing is refused when it comes.
 */
export async function startAttempt(
  actor: MemberActor,
  study: Study,
  input: StoredInput,
  transaction: Transaction,
): Promise<void> {
  await StudySlice.destroy({ where: { studyId: study.id }, transaction });
  const attempt = study.attempt + 1;
  await study.update(
    { state: 'queued', attempt, slicesDone: 0, failure: null, answer: null, startedAt: null, finishedAt: null },
    { transaction },
  );
  const jobs = Array.from({ length: study.sliceCount }, (_, index) => ({ studyId: study.id, attempt, index }));
  await enqueueAll(studySliceJob, jobs, {
    transaction,
    expireInSeconds: Math.max(studySliceJob.options.expireInSeconds, Math.ceil(SLACK * secondsPerSlice(input))),
  });
  const { question } = input;
  const points = question.study === 'errorGain' ? {} : { points: question.points.length };
  const details = { attempt, study: question.study, ...points };
  await recordAudit(actor, { action: 'study.asked', subjectId: study.id, details }, transaction);
}
