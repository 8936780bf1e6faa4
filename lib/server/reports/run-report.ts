import { createHash } from 'node:crypto';
import { reportInputSchema, reportOptionsSchema } from '@/lib/contracts/reports';
import { Report } from '@/models';
import { AppError } from '../errors';
import type { ReportJob } from '../jobs';
import { deleteObjects, putObject } from '../object-store';
import { failReport } from './fail-report';
import { makeReport } from './make-report';

/**
 * Makes one report and stores it. Safe to repeat; a worker that comes late, after a new attempt, changes nothing.
 * @throws Error where another try may help: the database or the store is gone.
 */
export async function runReport(job: ReportJob): Promise<void> {
  const { reportId, attempt } = job;
  const where = { id: reportId, attempt, state: ['queued', 'running'] };
  const [taken] = await Report.update({ state: 'running', done: 0 }, { where });
  if (taken === 0) return;
  const report = await Report.findByPk(reportId, { rejectOnEmpty: true });
  const input = reportInputSchema.safeParse(report.input);
  if (!input.success) return failReport(job, 'The frozen sheet cannot be read. Ask for the report again.');
  try {
    const options = reportOptionsSchema.parse(report.options);
    const made = await makeReport(input.data, report.organisationId, options, async (done) => {
      await Report.update({ done }, { where });
    });
    // A key of its own each attempt: two workers never write one object.
    const objectKey = `reports/${report.organisationId}/${reportId}/${attempt}`;
    await putObject(objectKey, made.bytes, made.mediaType);
    const sha256 = createHash('sha256').update(made.bytes).digest('hex');
    const [stored] = await Report.update(
      {
        state: 'done',
        done: report.total,
        objectKey,
        bytes: made.bytes.byteLength,
        sha256,
        pages: made.pages,
        finishedAt: new Date(),
      },
      { where },
    );
    if (stored === 0) await dropUnlessCurrent(reportId, objectKey);
  } catch (error) {
    // What the user chose cannot be made: no further try would help.
    if (error instanceof AppError) return failReport(job, error.detail);
    throw error;
  }
}

async function dropUnlessCurrent(reportId: string, objectKey: string): Promise<void> {
  const now = await Report.findByPk(reportId, { attributes: ['objectKey'] });
  if (now?.objectKey !== objectKey) await deleteObjects([objectKey]);
}
