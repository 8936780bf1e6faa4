import type { Report as ReportAnswer } from '@/lib/contracts/reports';
import type { Report } from '@/models';

export function presentReport(report: Report): ReportAnswer {
  return {
    id: report.id,
    layoutId: report.layoutId,
    revisionId: report.revisionId ?? null,
    options: report.options,
    state: report.state,
    progress: { done: report.done, total: report.total },
    failure: report.failure ?? null,
    fileName: report.fileName,
    bytes: report.bytes ?? null,
    pages: report.pages ?? null,
    sha256: report.sha256 ?? null,
    askedBy: report.asker?.name ?? 'a former member',
    askedAt: report.createdAt.toISOString(),
    finishedAt: report.finishedAt?.toISOString() ?? null,
  };
}
