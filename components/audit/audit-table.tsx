import { Button } from '@/components/ui/button';
import { DataCell, DataRow, DataTable, HeadCell } from '@/components/ui/data-table';
import { Tag } from '@/components/ui/tag';
import type { AuditEvent } from '@/lib/contracts/audit';
import { actionWords, detailWords } from './action-words';

interface AuditTableProps {
  readonly events: readonly AuditEvent[];
  readonly onSubject: (subjectId: string) => void;
}

const when = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'medium' });

const CAME_AS = { member: null, token: 'by a token', guest: 'guest', unknown: null } as const;

/** What was done, newest first. */
export function AuditTable({ events, onSubject }: AuditTableProps) {
  return (
    <DataTable caption="What was done, newest first">
      <thead>
        <tr>
          <HeadCell>When</HeadCell>
          <HeadCell>Who</HeadCell>
          <HeadCell>What</HeadCell>
          <HeadCell className="max-sm:hidden">Details</HeadCell>
          <HeadCell className="max-sm:hidden">Subject</HeadCell>
        </tr>
      </thead>
      <tbody>
        {events.map(({ id, at, who, email, kind, action, subjectId, details }) => (
          <DataRow key={id}>
            <DataCell className="align-top sm:whitespace-nowrap sm:align-middle">
              <time dateTime={at}>{when.format(new Date(at))}</time>
            </DataCell>
            <DataCell className="max-sm:align-top">
              {who} {CAME_AS[kind] && <Tag tone="neutral">{CAME_AS[kind]}</Tag>}
              {email && <span className="block text-sm text-ink-soft max-sm:hidden">{email}</span>}
            </DataCell>
            <DataCell>
              {actionWords(action)}
              <span className="block text-sm [overflow-wrap:anywhere] text-ink-soft sm:hidden">
                {detailWords(details)}
              </span>
            </DataCell>
            <DataCell className="max-w-md text-sm [overflow-wrap:anywhere] text-ink-soft max-sm:hidden">
              {detailWords(details)}
            </DataCell>
            <DataCell className="max-sm:hidden">
              {subjectId && (
                <Button
                  size="small"
                  variant="quiet"
                  className="font-mono"
                  aria-label={`Only what concerns ${subjectId}`}
                  onClick={() => onSubject(subjectId)}
                >
                  {subjectId.slice(0, 8)}
                </Button>
              )}
            </DataCell>
          </DataRow>
        ))}
      </tbody>
    </DataTable>
  );
}
