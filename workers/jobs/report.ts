import type { ReportJob } from '@/lib/server/jobs';
import { failReport } from '@/lib/server/reports/fail-report';
import { runReport } from '@/lib/server/reports/run-report';
import type { JobHandler } from './handler';

export const handler: JobHandler<ReportJob> = {
  handle: (job) => runReport(job),
  giveUp: (job, lastError) =>
    failReport(
      job,
      `The report could not be made in several tries. The last one ended with: ${lastError} ` +
        'Try again; if it fails again, tell your admin.',
    ),
};
