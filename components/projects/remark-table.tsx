import { isOverdue } from '@/components/share/remark-filter';
import { classNames } from '@/components/ui/class-names';
import { DataCell, DataRow, DataTable, HeadCell } from '@/components/ui/data-table';
import { TextLink } from '@/components/ui/link-button';
import { Moment } from '@/components/ui/moment';
import { Tag } from '@/components/ui/tag';
import type { Remark } from '@/lib/contracts/remarks';

/** One remark a row; its number leads to its spot. */
export function RemarkTable({ remarks }: { readonly remarks: readonly Remark[] }) {
  const today = new Date().toISOString().slice(0, 10);
  return (
    <DataTable caption="Remarks of the project" className="sm:min-w-[52rem]">
      <thead>
        <tr>
          <HeadCell>No.</HeadCell>
          <HeadCell>Sheet</HeadCell>
          <HeadCell className="sm:w-[38%]">Remark</HeadCell>
          <HeadCell className="max-sm:hidden">By</HeadCell>
          <HeadCell className="max-sm:hidden">Given to</HeadCell>
          <HeadCell className="max-sm:hidden">Due</HeadCell>
          <HeadCell>State</HeadCell>
        </tr>
      </thead>
      <tbody>
        {remarks.map((remark) => (
          <DataRow key={remark.id}>
            <DataCell>
              <TextLink href={`/revisions/${remark.revisionId}?remark=${remark.id}`} className="font-mono">
                {remark.number}
              </TextLink>
            </DataCell>
            <DataCell>
              {remark.layoutTitle} <span className="text-ink-soft">rev {remark.revisionNumber}</span>
            </DataCell>
            <DataCell>
              {remark.unread && <strong className="font-semibold text-petrol">New · </strong>}
              <span className="line-clamp-2">{remark.body}</span>
              {remark.replies.length > 0 && (
                <span className="text-sm text-ink-soft">
                  {remark.replies.length} {remark.replies.length === 1 ? 'answer' : 'answers'}
                </span>
              )}
            </DataCell>
            <DataCell className="max-sm:hidden">
              {remark.author.you ? 'You' : remark.author.name}, <Moment iso={remark.createdAt} />
            </DataCell>
            <DataCell className="max-sm:hidden">{remark.assignee?.name ?? '–'}</DataCell>
            <DataCell className={classNames('font-mono max-sm:hidden', isOverdue(remark, today) && 'text-red')}>
              {remark.dueOn ?? '–'}
              {isOverdue(remark, today) && <span className="sr-only"> overdue</span>}
            </DataCell>
            <DataCell>
              <Tag tone={remark.resolvedAt ? 'neutral' : 'fair'}>{remark.resolvedAt ? 'Settled' : 'Open'}</Tag>
            </DataCell>
          </DataRow>
        ))}
      </tbody>
    </DataTable>
  );
}
