'use client';

import { EmptyState } from '@/components/ui/empty-state';
import { Panel } from '@/components/ui/panel';
import { useMayActAs } from '@/lib/client/account-context';
import { useLayouts } from '@/lib/client/use-project';
import { DataPart } from '@/components/ui/data-part';
import { LayoutRevisions } from './layout-revisions';

/** What was issued: every revision of every variant, and the links that lead customers to them. */
export function RevisionsPanel({ projectId }: { projectId: string }) {
  const answer = useLayouts(projectId);
  const mayPlan = useMayActAs('planner');
  return (
    <Panel title="Revisions">
      <DataPart answer={answer} loading="Loading the revisions">
        {({ layouts }) => {
          const issued = layouts.filter((layout) => layout.latestRevision !== null);
          if (issued.length > 0) {
            return (
              <div>
                {issued.map((layout) => (
                  <LayoutRevisions key={layout.id} layout={layout} />
                ))}
              </div>
            );
          }
          return mayPlan ? (
            <EmptyState
              title="Nothing issued yet"
              body="Open a variant and press “Issue for review”: that freezes a numbered copy, which you can then share with the customer."
            />
          ) : (
            <EmptyState
              title="Nothing to review yet"
              body="As soon as a revision is issued it appears here, and you get an e-mail."
            />
          );
        }}
      </DataPart>
    </Panel>
  );
}
