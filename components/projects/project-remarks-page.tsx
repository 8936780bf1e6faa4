'use client';

import { useState } from 'react';
import { FILTER_WORDS, filteredRemarks, type RemarkFilter } from '@/components/share/remark-filter';
import { SubjectFault } from '@/components/shell/subject-fault';
import { DataPart } from '@/components/ui/data-part';
import { EmptyState } from '@/components/ui/empty-state';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { TitleBlock } from '@/components/ui/title-block';
import { useAccount } from '@/lib/client/account-context';
import { useProject } from '@/lib/client/use-project';
import { useProjectRemarks } from '@/lib/client/use-project-remarks';
import { RemarkTable } from './remark-table';

const FILTERS: readonly RemarkFilter[] = ['open', 'unread', 'mine', 'settled', 'all'];

/** All remarks of a project in one table: whose they are, until when, and what has not been read. */
export function ProjectRemarksPage({ projectId }: { readonly projectId: string }) {
  const project = useProject(projectId);
  const answer = useProjectRemarks(projectId);
  const { id: ownId } = useAccount();
  const [filter, setFilter] = useState<RemarkFilter>('open');
  if (project.error && !project.data) {
    return <SubjectFault error={project.error} onRetry={() => void project.mutate()} />;
  }
  return (
    <>
      <TitleBlock
        cells={[
          { label: 'Project', value: project.data?.name ?? '…', href: `/projects/${projectId}`, heading: true },
          { label: 'Remarks', value: answer.data?.remarks.length ?? '–', kind: 'figure' },
        ]}
      />
      <Page>
        <Panel title="Remarks">
          <div className="overflow-x-auto border-b border-hair px-3.5 py-2">
            <SegmentedControl
              label="Remarks shown"
              value={filter}
              onValueChange={setFilter}
              options={FILTERS.map((value) => ({ value, label: FILTER_WORDS[value] }))}
            />
          </div>
          <DataPart answer={answer} loading="Loading the remarks">
            {({ remarks }) => {
              const shown = filteredRemarks(remarks, filter, ownId);
              if (shown.length > 0) return <RemarkTable remarks={shown} />;
              return (
                <EmptyState
                  title={remarks.length === 0 ? 'No remarks yet' : 'None of these'}
                  body={
                    remarks.length === 0
                      ? 'What reviewers pin to an issued revision of this project is listed here.'
                      : `${remarks.length} remarks in all. Choose another filter to see them.`
                  }
                />
              );
            }}
          </DataPart>
        </Panel>
      </Page>
    </>
  );
}
