import { z } from 'zod';
import { studyAnswerSchema } from '@/lib/layout/standing/answer';
import { idSchema, timestampSchema } from './common';
import { mapStateSchema } from './maps';

/** POST /api/studies. The answer is 200 with a finished study, or 202 with one that is under way. */
export { studyQuestionSchema, type StudyQuestion } from '@/lib/layout/standing/question';

/** GET /api/studies/[studyId]; POST …/cancel and …/retry answer the same. */
export const studySchema = z.object({
  id: idSchema,
  /** SHA-256 of the whole question, the arm and the kernel's version. */
  key: z.string().length(64),
  state: mapStateSchema,
  progress: z.object({ done: z.number().int(), total: z.number().int() }),
  /** Why it failed, in plain words. */
  failure: z.string().nullable(),
  /** Null until it is done. */
  answer: studyAnswerSchema.nullable(),
  askedAt: timestampSchema,
  finishedAt: timestampSchema.nullable(),
});
export type Study = z.infer<typeof studySchema>;
