'use client';

import { SubjectFault } from '@/components/shell/subject-fault';
import { LinkButton } from '@/components/ui/link-button';
import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { TitleBlock } from '@/components/ui/title-block';
import { STATE_WORDS } from '@/components/projects/state-words';
import { useMayActAs } from '@/lib/client/account-context';
import { useAnswer } from '@/lib/client/use-answer';
import { useRevision } from '@/lib/client/use-review';
import type { ExportSubject } from '@/lib/contracts/exports';
import { layoutSchema } from '@/lib/contracts/layouts';
import { GENERAL_CAUTION, SAFETY_CAUTION } from '@/lib/layout/cautions';
import { FilesPanel } from './files-panel';
import { ReportForm } from './report-form';
import { ReportsPanel } from './reports-panel';

/** What a page about a sheet says of it. */
export interface HandedOver {
  readonly subject: ExportSubject;
  readonly subjectId: string;
  readonly projectId: string;
  readonly projectName: string;
  readonly name: string;
  /** Empty for a draft. */
  readonly revision: string;
  readonly state: string;
  readonly back: string;
}

/** The draft of a variant, for those who plan. */
export function LayoutHandOver({ projectId, layoutId }: { readonly projectId: string; readonly layoutId: string }) {
  const mayPlan = useMayActAs('planner');
  const { data, error, mutate } = useAnswer(mayPlan ? `/api/layouts/${layoutId}` : null, layoutSchema);
  if (!mayPlan) {
    return (
      <Page>
        <h1 className="sr-only">Hand over</h1>
        <Notice tone="caution">A draft is handed over by those who plan it. Open an issued revision instead.</Notice>
      </Page>
    );
  }
  if (error && !data) return <SubjectFault error={error} what="This variant" onRetry={() => void mutate()} />;
  if (!data) return <LoadingLine label="Opening the variant" />;
  return (
    <HandOver
      subject="layouts"
      subjectId={layoutId}
      projectId={projectId}
      projectName={data.projectName}
      name={`${data.letter} · ${data.name}`}
      revision=""
      state={STATE_WORDS.draft.name}
      back={`/projects/${projectId}/layouts/${layoutId}`}
    />
  );
}

/** An issued revision, for everybody who may see it. */
export function RevisionHandOver({ revisionId }: { readonly revisionId: string }) {
  const { data, error, mutate } = useRevision(revisionId);
  if (error && !data) return <SubjectFault error={error} what="This revision" onRetry={() => void mutate()} />;
  if (!data) return <LoadingLine label="Opening the revision" />;
  const { snapshot, number, state, projectId } = data;
  return (
    <HandOver
      subject="revisions"
      subjectId={revisionId}
      projectId={projectId}
      projectName={snapshot.projectName}
      name={`${snapshot.letter} · ${snapshot.name}`}
      revision={String(number)}
      state={STATE_WORDS[state].name}
      back={`/revisions/${revisionId}`}
    />
  );
}

function HandOver(sheet: HandedOver) {
  return (
    <>
      <TitleBlock
        cells={[
          { label: 'Project', value: sheet.projectName, href: `/projects/${sheet.projectId}`, wideOnly: true },
          { label: 'Hand over', value: sheet.name, heading: true },
          { label: 'Revision', value: sheet.revision || 'draft', kind: sheet.revision ? 'figure' : undefined },
          { label: 'State', value: sheet.state, tone: 'petrol' },
        ]}
        actions={
          <LinkButton href={sheet.back} variant="quiet">
            Back to the sheet
          </LinkButton>
        }
      />
      <Page className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_26rem]">
        <div className="grid min-w-0 gap-4">
          <ReportsPanel subject={sheet.subject} subjectId={sheet.subjectId} />
          <FilesPanel subject={sheet.subject} subjectId={sheet.subjectId} />
          <Notice tone="caution">
            {GENERAL_CAUTION} {SAFETY_CAUTION}
          </Notice>
        </div>
        <ReportForm sheet={sheet} />
      </Page>
    </>
  );
}
