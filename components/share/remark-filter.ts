import type { Remark } from '@/lib/contracts/remarks';

export type RemarkFilter = 'open' | 'unread' | 'mine' | 'settled' | 'all';

export const FILTER_WORDS: Record<RemarkFilter, string> = {
  open: 'Open',
  unread: 'Unread',
  mine: 'Given to me',
  settled: 'Settled',
  all: 'All',
};

/** The remarks that a filter lets through, open ones first, the newest above. */
export function filteredRemarks(
  remarks: readonly Remark[],
  filter: RemarkFilter,
  ownId: string | null,
): readonly Remark[] {
  const lets: Record<RemarkFilter, (remark: Remark) => boolean> = {
    open: ({ resolvedAt }) => resolvedAt === null,
    unread: ({ unread }) => unread,
    mine: ({ assignee }) => assignee !== null && assignee.id === ownId,
    settled: ({ resolvedAt }) => resolvedAt !== null,
    all: () => true,
  };
  return remarks
    .filter(lets[filter])
    .toSorted((a, b) => Number(a.resolvedAt !== null) - Number(b.resolvedAt !== null) || b.number - a.number);
}

/** Whether its day has passed while it is open; `today` as an ISO date. */
export const isOverdue = ({ dueOn, resolvedAt }: Remark, today: string): boolean =>
  dueOn !== null && resolvedAt === null && dueOn < today;
