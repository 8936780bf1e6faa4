import type { MailJob } from '@/lib/server/jobs';
import { deliverMail } from '@/lib/server/mail';
import type { JobHandler } from './handler';

export const handler: JobHandler<MailJob> = {
  handle: (job) => deliverMail(job),
  // The address is a person's and stays out of the log; the id finds the job in the queue's tables.
  giveUp: async ({ id, template }, lastError, { log }) => {
    log.error({ mailId: id, template, lastError }, 'mail could not be delivered');
  },
};
