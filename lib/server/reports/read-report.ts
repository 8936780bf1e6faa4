import type { ExportSubject } from '@/lib/contracts/exports';
import type { Report as ReportAnswer } from '@/lib/contracts/reports';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict, forbidden, notFound } from '../errors';
import { download } from '../exports/download';
import { findLayout } from '../layouts/data';
import { deleteObjects, getObject } from '../object-store';
import { actsAs, demandRole, type Actor, type MemberActor } from '../policy';
import { findRevision } from '../revisions/data';
import { findReport, reportsOf } from './data';
import { presentReport } from './present';

export async function listReports(actor: Actor, subject: ExportSubject, subjectId: string): Promise<ReportAnswer[]> {
  if (subject === 'revisions') await findRevision(actor, subjectId);
  else {
    demandRole(actor, 'planner');
    await findLayout(actor, subjectId);
  }
  return (await reportsOf(actor, subject, subjectId)).map(presentReport);
}

export async function readReport(actor: Actor, reportId: string): Promise<ReportAnswer> {
  return presentReport(await findReport(actor, reportId));
}

/** The file as a download. Throws 409 `report_not_ready` before it is made. */
export async function reportFile(actor: Actor, reportId: string): Promise<Response> {
  const report = await findReport(actor, reportId);
  if (report.state !== 'done' || !report.objectKey) {
    throw conflict('report_not_ready', 'This report is not made yet. Wait for it, or try it again if it has failed.');
  }
  const object = await getObject(report.objectKey);
  if (!object) throw notFound('report');
  return download(report.fileName, object.contentType, object.body);
}

/** Whoever asked for it may take it away again, and an integrator any. */
export async function removeReport(actor: MemberActor, reportId: string): Promise<void> {
  await inTransaction(async (transaction) => {
    const report = await findReport(actor, reportId, transaction, { lock: true });
    if (report.askedBy !== actor.userId && !actsAs(actor, 'integrator')) throw forbidden();
    await report.destroy({ transaction });
    await recordAudit(
      actor,
      { action: 'report.removed', subjectId: reportId, details: { file: report.fileName } },
      transaction,
    );
    if (report.objectKey) await deleteObjects([report.objectKey]);
  });
}
