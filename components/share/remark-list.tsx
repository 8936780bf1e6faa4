'use client';

import { useState } from 'react';
import { Select } from '@/components/ui/select';
import { sayError } from '@/lib/client/fetcher';
import type { Review } from '@/lib/client/use-review';
import type { Person } from '@/lib/contracts/remarks';
import { OneRemark } from './one-remark';
import { FILTER_WORDS, filteredRemarks, type RemarkFilter } from './remark-filter';

interface RemarkListProps {
  readonly review: Review;
  readonly mayRemark: boolean;
  readonly asGuest: boolean;
  readonly people: readonly Person[];
  /** Of the revision shown: remarks on earlier ones say so. */
  readonly number: number;
  readonly chosenId: string | null;
  readonly onChoose: (remarkId: string | null) => void;
}

/** With fewer there is nothing to filter. */
const FILTER_FROM = 4;

/** Remarks as they are pinned, open ones first, the newest above; one at a time is open to be answered. */
export function RemarkList(props: RemarkListProps) {
  const { review, mayRemark, chosenId, onChoose } = props;
  const { remarks, error } = review;
  const [filter, setFilter] = useState<RemarkFilter>('all');
  if (!remarks) {
    return <p className="px-3.5 py-3 text-ink-soft">{error ? sayError(error) : 'Reading the remarks…'}</p>;
  }
  if (remarks.length === 0) {
    return (
      <p className="px-3.5 py-3 text-ink-soft">
        {mayRemark ? 'None yet. Tap the spot on the drawing that your remark is about.' : 'None yet.'}
      </p>
    );
  }
  const filters: RemarkFilter[] = review.markRead ? ['all', 'open', 'unread', 'settled'] : ['all', 'open', 'settled'];
  const listed = filteredRemarks(remarks, filter, null);
  // A pin that is pressed opens its remark whatever the filter says.
  const chosen = remarks.find(({ id }) => id === chosenId);
  const shown = chosen && !listed.includes(chosen) ? [chosen, ...listed] : listed;
  return (
    <>
      {remarks.length >= FILTER_FROM && (
        <div className="border-b border-hair px-3.5 py-2">
          <Select
            aria-label="Remarks shown"
            value={filter}
            onValueChange={setFilter}
            options={filters.map((value) => ({ value, label: FILTER_WORDS[value] }))}
          />
        </div>
      )}
      {shown.length === 0 && <p className="px-3.5 py-3 text-ink-soft">None of these.</p>}
      <ul>
        {shown.map((remark) => (
          <OneRemark
            {...props}
            key={remark.id}
            remark={remark}
            isChosen={remark.id === chosenId}
            onToggle={() => onChoose(remark.id === chosenId ? null : remark.id)}
          />
        ))}
      </ul>
    </>
  );
}
