import { Study } from '@/models';
import type { StudySliceJob } from '../jobs';

/** Ends an attempt with a reason in plain words; does nothing where it is no longer the current one. */
export async function failStudy({ studyId, attempt }: StudySliceJob, reason: string): Promise<void> {
  await Study.update(
    { state: 'failed', failure: reason, finishedAt: new Date() },
    { where: { id: studyId, attempt, state: ['queued', 'running'] } },
  );
}
