'use client';

import { useMemo } from 'react';
import { DataPart } from '@/components/ui/data-part';
import { SectionHeader } from '@/components/shell/section-header';
import { ArmsTable } from '@/components/tables/arms-table';
import { EmptyState } from '@/components/ui/empty-state';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { useArms } from '@/lib/client/use-arms';

/** The arm library of the organisation: the newest version of each. */
export function ArmsPage() {
  const answer = useArms();
  const arms = useMemo(() => answer.data?.arms.filter((arm) => arm.latest) ?? [], [answer.data]);
  return (
    <>
      <SectionHeader current="/arms" />
      <Page>
        <Panel title="Arms" level={1} aside={answer.data && <span className="font-mono">{arms.length}</span>}>
          <DataPart answer={answer} loading="Loading the arms">
            {() =>
              arms.length > 0 ? (
                <ArmsTable arms={arms} />
              ) : (
                <EmptyState
                  title="The library is empty"
                  body="Ask an integrator of your organisation to add the arms you plan with."
                />
              )
            }
          </DataPart>
        </Panel>
      </Page>
    </>
  );
}
