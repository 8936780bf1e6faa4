import type { StudySliceJob } from '@/lib/server/jobs';
import { failStudy } from '@/lib/server/studies/fail-study';
import { runStudySlice } from '@/lib/server/studies/run-slice';
import type { JobHandler } from './handler';

export const handler: JobHandler<StudySliceJob> = {
  handle: (job, { studies }) => runStudySlice(job, studies),
  giveUp: (job, lastError) =>
    failStudy(
      job,
      `A part of the study could not be worked out in several tries. The last one ended with: ${lastError} ` +
        'Try again; if it fails again, tell your admin.',
    ),
};
