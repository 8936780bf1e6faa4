'use client';

import { FileUp, Plus } from 'lucide-react';
import { useMemo, useState } from 'react';
import { DataPart } from '@/components/ui/data-part';
import { SectionHeader } from '@/components/shell/section-header';
import { ArmsTable } from '@/components/tables/arms-table';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { useMayActAs } from '@/lib/client/account-context';
import { useArms } from '@/lib/client/use-arms';

type Shelf = 'current' | 'archived';

/** The arm library of the organisation: the newest version of each. */
export function ArmsPage() {
  const mayEdit = useMayActAs('integrator');
  const [shelf, setShelf] = useState<Shelf>('current');
  const answer = useArms({ archived: shelf === 'archived' });
  const arms = useMemo(() => answer.data?.arms.filter((arm) => arm.latest) ?? [], [answer.data]);
  return (
    <>
      <SectionHeader
        current="/arms"
        actions={
          mayEdit && (
            <>
              <LinkButton href="/arms/import" variant="quiet">
                <FileUp aria-hidden className="size-4" />
                Import
              </LinkButton>
              <LinkButton href="/arms/new" variant="action">
                <Plus aria-hidden className="size-4" />
                New arm
              </LinkButton>
            </>
          )
        }
      />
      <Page>
        <Panel
          title="Arms"
          level={1}
          aside={
            <SegmentedControl
              label="Which arms"
              value={shelf}
              onValueChange={setShelf}
              options={[
                { value: 'current', label: 'Current' },
                { value: 'archived', label: 'Archived' },
              ]}
            />
          }
        >
          <DataPart answer={answer} loading="Loading the arms">
            {() => (arms.length > 0 ? <ArmsTable arms={arms} /> : <NoArms shelf={shelf} mayEdit={mayEdit} />)}
          </DataPart>
        </Panel>
      </Page>
    </>
  );
}

function NoArms({ shelf, mayEdit }: { shelf: Shelf; mayEdit: boolean }) {
  if (shelf === 'archived')
    return (
      <EmptyState
        title="Nothing is archived"
        body="An arm that is not planned with any more can be put away on its page. Layouts that use it keep it."
      />
    );
  return (
    <EmptyState
      title="The library is empty"
      body={
        mayEdit
          ? 'Import a DH table or a URDF file, or write the joints yourself.'
          : 'Ask an integrator of your organisation to add the arms you plan with.'
      }
      action={mayEdit && <LinkButton href="/arms/import">Import an arm</LinkButton>}
    />
  );
}
