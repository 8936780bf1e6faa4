'use client';

import { KeyRound } from 'lucide-react';
import { useMemo, useState } from 'react';
import { SectionHeader } from '@/components/shell/section-header';
import { ROLE_NAMES } from '@/components/shell/role-words';
import { SortableTable, type TableColumn } from '@/components/tables/sortable-table';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { DataPart } from '@/components/ui/data-part';
import { EmptyState } from '@/components/ui/empty-state';
import { TextLink } from '@/components/ui/link-button';
import { Moment } from '@/components/ui/moment';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { Tag } from '@/components/ui/tag';
import { useApiTokenActions, useApiTokens } from '@/lib/client/use-api-tokens';
import type { ApiToken } from '@/lib/contracts/api-tokens';
import { NewTokenDialog } from './new-token-dialog';

/** One's own keys for programs: make one, see when it was used last, take it back. */
export function TokensPage() {
  const answer = useApiTokens();
  const { revoke } = useApiTokenActions();
  const [isMaking, setIsMaking] = useState(false);
  const [leaving, setLeaving] = useState<ApiToken | null>(null);
  const columns = useMemo(() => columnsWith(setLeaving), []);
  const make = (
    <Button variant="action" onClick={() => setIsMaking(true)}>
      <KeyRound aria-hidden className="size-4" />
      New token
    </Button>
  );
  return (
    <>
      <SectionHeader current="/tokens" actions={make} />
      <Page className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_22rem]">
        <Panel title="API tokens" level={1}>
          <DataPart answer={answer} loading="Loading your tokens">
            {({ tokens }) =>
              tokens.length === 0 ? (
                <EmptyState
                  title="No token yet"
                  body="A token lets a program of yours fetch or change things here without your password. Make one for each program."
                />
              ) : (
                <SortableTable caption="Your API tokens" rows={tokens} columns={columns} rowId={({ id }) => id} />
              )
            }
          </DataPart>
        </Panel>
        <Panel title="How to use one">
          <div className="grid gap-2.5 px-3.5 py-3 text-[0.9375rem]">
            <p>Send it with every request:</p>
            <pre className="overflow-x-auto border border-rule bg-paper px-2.5 py-2 font-mono text-[0.8125rem]">
              {'curl -H "Authorization: Bearer elbow_…" \\\n  https://…/api/projects'}
            </pre>
            <p>
              What can be asked for, and with which fields, says the{' '}
              <TextLink href="/api-reference">API reference</TextLink>.
            </p>
          </div>
        </Panel>
      </Page>
      {isMaking && <NewTokenDialog onClose={() => setIsMaking(false)} />}
      <ConfirmDialog
        open={leaving !== null}
        onOpenChange={(open) => !open && setLeaving(null)}
        title={`Take back “${leaving?.name ?? ''}”?`}
        description="Programs that use it are refused from their next request on. This cannot be undone; make a new token instead."
        confirmLabel="Take it back"
        danger
        onConfirm={async () => {
          if (leaving) await revoke(leaving.id);
        }}
      />
    </>
  );
}

function stateOf({ revokedAt, expiresAt }: ApiToken): 'in use' | 'taken back' | 'expired' {
  if (revokedAt) return 'taken back';
  return new Date(expiresAt) < new Date() ? 'expired' : 'in use';
}

function columnsWith(onRevoke: (token: ApiToken) => void): TableColumn<ApiToken>[] {
  return [
    {
      id: 'name',
      header: 'For',
      value: ({ name }) => name,
      cell: ({ name, hint }) => (
        <>
          <span className="block font-medium">{name}</span>
          <span className="block font-mono text-sm text-ink-soft">{hint}</span>
        </>
      ),
    },
    {
      id: 'role',
      header: 'May',
      value: ({ role }) => role,
      cell: ({ role, readOnly }) => `${ROLE_NAMES[role]}${readOnly ? ', read only' : ''}`,
    },
    {
      id: 'used',
      header: 'Last used',
      value: ({ lastUsedAt }) => lastUsedAt,
      cell: ({ lastUsedAt }) => (lastUsedAt ? <Moment iso={lastUsedAt} /> : 'never'),
      wideOnly: true,
    },
    {
      id: 'expires',
      header: 'Until',
      value: ({ expiresAt }) => expiresAt,
      cell: ({ expiresAt }) => <Moment iso={expiresAt} />,
      wideOnly: true,
    },
    {
      id: 'state',
      header: 'State',
      value: stateOf,
      cell: (token) => <Tag tone={stateOf(token) === 'in use' ? 'roomy' : 'neutral'}>{stateOf(token)}</Tag>,
    },
    {
      id: 'deeds',
      header: 'Take back',
      headerHidden: true,
      cell: (token) =>
        stateOf(token) === 'in use' && (
          <Button size="small" variant="quiet" aria-label={`Take back ${token.name}`} onClick={() => onRevoke(token)}>
            Take back
          </Button>
        ),
      className: 'text-right',
    },
  ];
}
