import { z } from 'zod';
import type { JobDefinition } from './definition';

/** One attempt at a report. */
export const reportJobSchema = z.object({ reportId: z.uuid(), attempt: z.number().int().min(1) });
export type ReportJob = z.infer<typeof reportJobSchema>;

export const reportJob = {
  name: 'report',
  schema: reportJobSchema,
  // A report takes seconds; a long one on a busy machine a minute.
  options: { expireInSeconds: 300, retryLimit: 10, retryDelay: 2, retryBackoff: true },
} as const satisfies JobDefinition<typeof reportJobSchema>;
