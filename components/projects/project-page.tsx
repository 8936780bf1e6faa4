'use client';

import { Pencil } from 'lucide-react';
import { useState } from 'react';
import { ProjectDialog } from '@/components/forms/project-dialog';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { TitleBlock } from '@/components/ui/title-block';
import { useMayActAs } from '@/lib/client/account-context';
import { useProject } from '@/lib/client/use-project';
import { useProjectActions } from '@/lib/client/use-projects';
import { ComparisonsPanel } from './comparisons-panel';
import { FloorPlansPanel } from './floor-plans-panel';
import { OpenRemarksPanel } from './open-remarks-panel';
import { SubjectFault } from '@/components/shell/subject-fault';
import { RevisionsPanel } from './revisions-panel';
import { VariantsPanel } from './variants-panel';

/** One project: its variants, floor plans, revisions and open remarks. A viewer gets what was issued. */
export function ProjectPage({ projectId }: { projectId: string }) {
  const { data: project, error, mutate } = useProject(projectId);
  const mayPlan = useMayActAs('planner');
  const { change } = useProjectActions();
  const [isRenaming, setIsRenaming] = useState(false);
  if (error && !project) return <SubjectFault error={error} onRetry={() => void mutate()} />;

  return (
    <>
      <TitleBlock
        cells={[
          { label: 'Project', value: project?.name ?? '…', heading: true },
          { label: 'Customer', value: project?.customerName || '–' },
          { label: 'Site', value: project?.siteName || '–', wideOnly: true },
          { label: 'Variants', value: project?.layoutCount ?? '–', kind: 'figure', wideOnly: true },
        ]}
        actions={
          mayPlan &&
          project && (
            <Button variant="quiet" onClick={() => setIsRenaming(true)}>
              <Pencil aria-hidden className="size-4" />
              Rename
            </Button>
          )
        }
      />
      <Page>
        {project?.archivedAt && (
          <Notice
            tone="caution"
            className="mb-4"
            action={
              mayPlan && (
                <Button size="small" onClick={() => void change(projectId, { archived: false })}>
                  Bring it back
                </Button>
              )
            }
          >
            This project is archived. It can still be read and edited, but it is left out of the list of current
            projects.
          </Notice>
        )}
        {/* On a narrow screen one column, the floor plans before the revisions: that is the order of the work. */}
        <div className="flex flex-col gap-4 lg:grid lg:grid-cols-[minmax(0,1fr)_26rem] lg:items-start">
          <div className="contents min-w-0 gap-4 lg:flex lg:flex-col">
            {mayPlan && <VariantsPanel projectId={projectId} />}
            <div className="order-3 min-w-0">
              <RevisionsPanel projectId={projectId} />
              <div className="mt-4 empty:hidden">
                <ComparisonsPanel projectId={projectId} />
              </div>
            </div>
          </div>
          <div className="contents min-w-0 gap-4 lg:flex lg:flex-col">
            {mayPlan && <FloorPlansPanel projectId={projectId} />}
            <div className="order-4 min-w-0">
              <OpenRemarksPanel projectId={projectId} count={project?.openRemarkCount} />
            </div>
          </div>
        </div>
      </Page>
      {project && (
        <ProjectDialog
          open={isRenaming}
          onOpenChange={setIsRenaming}
          title="Rename project"
          submitLabel="Save"
          start={project}
          onSubmit={async (request) => {
            await change(projectId, request);
            setIsRenaming(false);
          }}
        />
      )}
    </>
  );
}
