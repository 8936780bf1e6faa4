import { Report } from '@/models';
import type { ReportJob } from '../jobs';

/** Tells whoever waits that this attempt has failed for good. */
export async function failReport({ reportId, attempt }: ReportJob, failure: string): Promise<void> {
  const where = { id: reportId, attempt, state: ['queued', 'running'] };
  await Report.update({ state: 'failed', failure, finishedAt: new Date() }, { where });
}
