import type { Transaction } from 'sequelize';
import type { StudySlice as Slice } from '@/lib/layout/standing/study';
import { Study, StudySlice } from '@/models';
import { inTransaction } from '../database';
import type { StudySliceJob } from '../jobs';
import type { StudyComputer } from './computer';
import { failStudy } from './fail-study';
import { isOfThisVersion, storedInputSchema, type StoredInput } from './question';
import { partsOfSlice } from './slicing';

/**
 * Computes and stores one slice; the slice that completes the study also answers it. Safe to repeat.
 * @throws Error where another try may help: the database or a thread is gone, or the worker is of another version.
 */
export async function runStudySlice(job: StudySliceJob, computer: StudyComputer): Promise<void> {
  const study = await Study.findByPk(job.studyId);
  if (!study || !isCurrent(study, job)) return;
  const input = storedInputSchema.safeParse(study.input);
  if (!input.success) return failStudy(job, 'The stored question cannot be read. Ask for the study again.');
  if (!isOfThisVersion(input.data)) throw new Error('The study was asked of another version of the computation.');
  await markRunning(job);
  const { question, arm } = input.data;
  const parts = partsOfSlice(question, study.sliceCount, job.index);
  const result = await computer.computeSlice({ question, arm, ...parts });
  if ('fault' in result) return failStudy(job, `The study cannot be worked out: ${result.fault}`);
  await storeSlice(job, input.data, result.slice, computer);
}

function isCurrent(study: Study, { attempt }: StudySliceJob): boolean {
  return study.attempt === attempt && (study.state === 'queued' || study.state === 'running');
}

async function markRunning({ studyId, attempt }: StudySliceJob): Promise<void> {
  const where = { id: studyId, attempt, state: 'queued' };
  await Study.update({ state: 'running', startedAt: new Date() }, { where });
}

/** Fenced: a worker that comes late, after a cancel or a new attempt, changes nothing. */
export async function storeSlice(
  job: StudySliceJob,
  input: StoredInput,
  slice: Slice,
  computer: Pick<StudyComputer, 'answerStudy'>,
): Promise<boolean> {
  const { studyId, attempt, index } = job;
  return inTransaction(async (transaction) => {
    const study = await Study.findByPk(studyId, { lock: transaction.LOCK.UPDATE, transaction });
    if (!study || !isCurrent(study, job)) return false;
    await StudySlice.bulkCreate([{ studyId, attempt, index, result: slice }], { ignoreDuplicates: true, transaction });
    const slicesDone = await StudySlice.count({ where: { studyId, attempt }, transaction });
    if (slicesDone < study.sliceCount) await study.update({ slicesDone }, { transaction });
    else await finish(study, input, computer, transaction);
    return true;
  });
}

async function finish(
  study: Study,
  { question, arm }: StoredInput,
  computer: Pick<StudyComputer, 'answerStudy'>,
  transaction: Transaction,
): Promise<void> {
  const where = { studyId: study.id, attempt: study.attempt };
  const rows = await StudySlice.findAll({ where, order: [['index', 'ASC']], transaction });
  // They were stored by the lines above, under the same attempt.
  const slices = rows.map(({ result }) => result as Slice);
  const answer = await computer.answerStudy({ question, arm, slices });
  await study.update({ state: 'done', slicesDone: study.sliceCount, answer, finishedAt: new Date() }, { transaction });
  // The answer holds everything that they hold.
  await StudySlice.destroy({ where: { studyId: study.id }, transaction });
}
