'use client';

import { Download, RotateCw, Trash2 } from 'lucide-react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { DataPart } from '@/components/ui/data-part';
import { EmptyState } from '@/components/ui/empty-state';
import { Moment } from '@/components/ui/moment';
import { Panel } from '@/components/ui/panel';
import { Progress } from '@/components/ui/progress';
import { toast } from '@/components/ui/toaster';
import { useAccount, useMayActAs } from '@/lib/client/account-context';
import { sayError } from '@/lib/client/fetcher';
import { saveFile } from '@/lib/client/save-file';
import { useReportActions, useReports } from '@/lib/client/use-reports';
import type { ExportSubject } from '@/lib/contracts/exports';
import type { Report } from '@/lib/contracts/reports';

interface ReportsPanelProps {
  readonly subject: ExportSubject;
  readonly subjectId: string;
}

/** The reports that were made of a sheet, newest first. */
export function ReportsPanel({ subject, subjectId }: ReportsPanelProps) {
  const answer = useReports(subject, subjectId);
  const { remove } = useReportActions(subject, subjectId);
  const [leaving, setLeaving] = useState<Report | null>(null);
  return (
    <Panel title="Reports">
      <div aria-live="polite">
        <DataPart answer={answer} loading="Loading the reports">
          {({ reports }) =>
            reports.length === 0 ? (
              <EmptyState
                title="No report made yet"
                body="Choose paper and scale, then make the PDF. It is kept here for everybody who may see this sheet."
              />
            ) : (
              <ul>
                {reports.map((report) => (
                  <ReportRow
                    key={report.id}
                    report={report}
                    subject={subject}
                    subjectId={subjectId}
                    onRemove={() => setLeaving(report)}
                  />
                ))}
              </ul>
            )
          }
        </DataPart>
      </div>
      <ConfirmDialog
        open={leaving !== null}
        onOpenChange={(open) => !open && setLeaving(null)}
        title="Remove this report?"
        description={`${leaving?.fileName ?? ''} goes from this list for everybody. The sheet itself stays as it is.`}
        confirmLabel="Remove report"
        danger
        onConfirm={async () => {
          if (leaving) await remove(leaving.id);
        }}
      />
    </Panel>
  );
}

const STEPS = ['Waiting for its turn', 'Drawing the map', 'Laying out the pages', 'Storing the file'] as const;

function ReportRow({
  report,
  subject,
  subjectId,
  onRemove,
}: ReportsPanelProps & { readonly report: Report; readonly onRemove: () => void }) {
  const { retry } = useReportActions(subject, subjectId);
  const account = useAccount();
  const mayRemoveAny = useMayActAs('integrator');
  const { options, state, progress, fileName, pages, bytes } = report;
  const act = (deed: () => Promise<unknown>) => () => void deed().catch((error) => toast.error(sayError(error)));
  const scale = options.scale === 'fit' ? 'fit to page' : `1:${options.scale}`;
  const underWay = state === 'queued' || state === 'running';
  const mayRemove = !underWay && (mayRemoveAny || report.askedBy === account.name);
  return (
    <li className="border-t border-hair px-3.5 py-2.5 first:border-t-0">
      <div className="flex flex-wrap items-center justify-between gap-x-3 gap-y-2">
        <div className="min-w-0 flex-1">
          <p className="font-medium break-all">{fileName}</p>
          <p className="text-sm text-ink-soft">
            {options.kind === 'pdf' ? 'PDF report' : 'PNG'}, {options.paper}, {scale}
            {pages !== null && `, ${pages} ${pages === 1 ? 'page' : 'pages'}`}
            {bytes !== null && `, ${sizeWords(bytes)}`} · <Moment iso={report.askedAt} />, {report.askedBy}
          </p>
        </div>
        <div className="flex shrink-0 gap-2">
          {state === 'done' && (
            <Button
              size="small"
              variant="action"
              aria-label={`Download ${fileName}`}
              onClick={act(() => saveFile(`/api/reports/${report.id}/file`))}
            >
              <Download aria-hidden className="size-4" />
              Download
            </Button>
          )}
          {state === 'failed' && (
            <Button size="small" onClick={act(() => retry(report.id))}>
              <RotateCw aria-hidden className="size-4" />
              Try again
            </Button>
          )}
          {mayRemove && (
            <Button size="small" variant="quiet" aria-label={`Remove ${fileName}`} onClick={onRemove}>
              <Trash2 aria-hidden className="size-4" />
            </Button>
          )}
        </div>
      </div>
      {underWay && (
        <div className="mt-2">
          <Progress
            label={state === 'queued' ? STEPS[0] : STEPS[Math.min(progress.done + 1, STEPS.length - 1)]}
            share={progress.done / progress.total}
          />
        </div>
      )}
      {state === 'failed' && <p className="mt-1 text-sm font-medium text-red">{report.failure}</p>}
    </li>
  );
}

const sizeWords = (bytes: number): string =>
  bytes < 1_000_000 ? `${Math.max(1, Math.round(bytes / 1000))} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`;
