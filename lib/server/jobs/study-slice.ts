import { z } from 'zod';
import type { JobDefinition } from './definition';

/** One slice of one attempt at a study. */
export const studySliceSchema = z.object({
  studyId: z.uuid(),
  attempt: z.number().int().min(1),
  index: z.number().int().min(0),
});
export type StudySliceJob = z.infer<typeof studySliceSchema>;

export const studySliceJob = {
  name: 'study-slice',
  schema: studySliceSchema,
  // A slice takes about a second; a study hangs for this long when its worker is killed.
  options: { expireInSeconds: 30, retryLimit: 10, retryDelay: 1, retryBackoff: false },
} as const satisfies JobDefinition<typeof studySliceSchema>;
