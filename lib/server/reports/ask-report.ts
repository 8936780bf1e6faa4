import type { Transaction } from 'sequelize';
import type { Report as ReportAnswer, ReportRequest } from '@/lib/contracts/reports';
import { Report } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { tooManyRequests } from '../errors';
import { fileStem } from '../exports/subject';
import { reportJob } from '../jobs';
import type { MemberActor } from '../policy';
import { enqueue } from '../queue';
import { findReport } from './data';
import { presentReport } from './present';
import { reportInput } from './report-input';
import { REPORT_STEPS } from './steps';

/** An organisation cannot fill the queue that all of them share. */
const UNDER_WAY_LIMIT = 20;

/**
 * Freezes the sheet and puts the making of its report into the queue.
 * @throws 404 for a sheet that is not theirs, 403 for a draft that a viewer asks for, 429 with too many under way.
 */
export async function askReport(
  actor: MemberActor,
  request: ReportRequest,
  outer?: Transaction,
): Promise<ReportAnswer> {
  return inTransaction(async (transaction) => {
    const { handed, input } = await reportInput(actor, request, transaction);
    const where = { organisationId: actor.organisationId, state: ['queued', 'running'] };
    if ((await Report.count({ where, transaction })) >= UNDER_WAY_LIMIT) {
      throw tooManyRequests(`${UNDER_WAY_LIMIT} reports are under way already. Wait for one to finish.`, 10);
    }
    const { options } = request;
    const report = await Report.create(
      {
        organisationId: actor.organisationId,
        layoutId: handed.layoutId,
        revisionId: handed.revision?.id ?? null,
        options,
        input,
        total: REPORT_STEPS,
        fileName: `${fileStem(handed)}-${options.paper}.${options.kind}`,
        askedBy: actor.userId,
      },
      { transaction },
    );
    await enqueue(reportJob, { reportId: report.id, attempt: 1 }, { transaction });
    const details = { kind: options.kind, paper: options.paper, scale: options.scale };
    await recordAudit(actor, { action: 'report.asked', subjectId: report.id, details }, transaction);
    return presentReport(await findReport(actor, report.id, transaction));
  }, outer);
}

/** Tries a report that failed again, of the same frozen sheet; one that is under way or done stays as it is. */
export async function retryReport(actor: MemberActor, reportId: string, outer?: Transaction): Promise<ReportAnswer> {
  return inTransaction(async (transaction) => {
    const report = await findReport(actor, reportId, transaction, { lock: true });
    if (report.state !== 'failed') return presentReport(report);
    const attempt = report.attempt + 1;
    await report.update({ state: 'queued', attempt, done: 0, failure: null, finishedAt: null }, { transaction });
    await enqueue(reportJob, { reportId, attempt }, { transaction });
    await recordAudit(actor, { action: 'report.retried', subjectId: reportId }, transaction);
    return presentReport(report);
  }, outer);
}
