'use client';

import { Download } from 'lucide-react';
import { useState } from 'react';
import useSWRInfinite from 'swr/infinite';
import { SectionHeader } from '@/components/shell/section-header';
import { Button } from '@/components/ui/button';
import { DataPart } from '@/components/ui/data-part';
import { EmptyState } from '@/components/ui/empty-state';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { toast } from '@/components/ui/toaster';
import { useMayActAs } from '@/lib/client/account-context';
import { fetcher, sayError } from '@/lib/client/fetcher';
import { saveFile } from '@/lib/client/save-file';
import { useSettled } from '@/lib/client/use-settled';
import { auditFilterSchema, auditPageSchema, type AuditFilter, type AuditPage as Answer } from '@/lib/contracts/audit';
import { AuditFilters } from './audit-filters';
import { AuditTable } from './audit-table';

/** Who did what, for admins. */
export function AuditPage() {
  const mayAdmin = useMayActAs('admin');
  if (mayAdmin) return <Audit />;
  return (
    <>
      <SectionHeader current="/audit" />
      <Page>
        <h1 className="sr-only">Audit</h1>
        <Notice tone="caution">The audit is read by the admins of your organisation. Ask one of them.</Notice>
      </Page>
    </>
  );
}

const NO_FILTER: AuditFilter = auditFilterSchema.parse({});

function addressOf(filter: AuditFilter, before = ''): string {
  const given = Object.entries({ ...filter, before }).filter(([, value]) => value !== '');
  return new URLSearchParams(given).toString();
}

function Audit() {
  const [filter, setFilter] = useState(NO_FILTER);
  // What is typed is asked for once the typing rests.
  const settled = useSettled(filter, 300);
  const pages = useSWRInfinite<Answer, Error>(
    (index: number, last: Answer | null) => {
      if (index > 0 && !last?.next) return null;
      return `/api/audit?${addressOf(settled, last?.next ?? '')}`;
    },
    (url: string) => fetcher(url, auditPageSchema),
    { keepPreviousData: true },
  );
  const data = pages.data;
  const more = data?.[data.length - 1]?.next ?? null;
  return (
    <>
      <SectionHeader
        current="/audit"
        actions={
          <Button
            onClick={() =>
              void saveFile(`/api/audit/csv?${addressOf(settled)}`).catch((error) => toast.error(sayError(error)))
            }
          >
            <Download aria-hidden className="size-4" />
            CSV
          </Button>
        }
      />
      <Page>
        <Panel title="Audit" level={1}>
          <AuditFilters filter={filter} actions={data?.[0]?.actions ?? []} onChange={setFilter} />
          <DataPart answer={{ data, error: pages.error, mutate: pages.mutate }} loading="Loading what was done">
            {(answers) => {
              const events = answers.flatMap((answer) => answer.events);
              if (events.length > 0)
                return <AuditTable events={events} onSubject={(subjectId) => setFilter({ ...NO_FILTER, subjectId })} />;
              return (
                <EmptyState
                  title="Nothing was found"
                  body="Nobody did anything that fits this filter. Widen it, or take it off."
                  action={<Button onClick={() => setFilter(NO_FILTER)}>Show everything</Button>}
                />
              );
            }}
          </DataPart>
          {more && (
            <p className="border-t border-hair px-3.5 py-2.5">
              <Button busy={pages.isValidating} busyLabel="Loading…" onClick={() => void pages.setSize(pages.size + 1)}>
                Show older
              </Button>
            </p>
          )}
        </Panel>
      </Page>
    </>
  );
}
