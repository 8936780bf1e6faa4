import { z } from 'zod';
import type { JobDefinition } from './definition';

/**
 * One mail to one person. `id` is made by the sender and stays the same at every attempt, so that a mail is not sent twice.
 * `data` fills the template; whoever sends checks it, since the queue knows no templates.
 */
export const mailSchema = z.object({
  id: z.uuid(),
  to: z.email(),
  template: z.string().min(1),
  data: z.record(z.string(), z.unknown()),
});
export type MailJob = z.infer<typeof mailSchema>;

export const mailJob = {
  name: 'mail',
  schema: mailSchema,
  // With the delay doubling, twelve attempts last about eleven hours: longer than most outages of a mail server.
  options: { expireInSeconds: 60, retryLimit: 12, retryDelay: 10, retryBackoff: true },
} as const satisfies JobDefinition<typeof mailSchema>;
