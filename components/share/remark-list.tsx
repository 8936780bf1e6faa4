'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { Moment } from '@/components/ui/moment';
import { sayError } from '@/lib/client/fetcher';
import type { Review } from '@/lib/client/use-review';
import type { Remark } from '@/lib/contracts/remarks';
import { RemarkForm } from './remark-form';

interface RemarkListProps {
  readonly review: Review;
  readonly mayRemark: boolean;
  readonly asGuest: boolean;
  readonly chosenId: string | null;
  readonly onChoose: (remarkId: string | null) => void;
}

/** Remarks as they are pinned, open ones first, the newest above; one at a time is open to be answered. */
export function RemarkList({ review, mayRemark, asGuest, chosenId, onChoose }: RemarkListProps) {
  const { remarks, error } = review;
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
  const ordered = [...remarks].sort(
    (a, b) => Number(a.resolvedAt !== null) - Number(b.resolvedAt !== null) || b.number - a.number,
  );
  return (
    <ul>
      {ordered.map((remark) => (
        <OneRemark
          key={remark.id}
          remark={remark}
          isChosen={remark.id === chosenId}
          onToggle={() => onChoose(remark.id === chosenId ? null : remark.id)}
          review={review}
          mayRemark={mayRemark}
          asGuest={asGuest}
        />
      ))}
    </ul>
  );
}

interface OneRemarkProps extends Pick<RemarkListProps, 'review' | 'mayRemark' | 'asGuest'> {
  readonly remark: Remark;
  readonly isChosen: boolean;
  readonly onToggle: () => void;
}

function OneRemark({ remark, isChosen, onToggle, review, mayRemark, asGuest }: OneRemarkProps) {
  const { id, number, author, body, createdAt, replies, resolvedAt } = remark;
  const isSettled = resolvedAt !== null;
  const detailsId = `remark-${id}`;
  return (
    <li className="border-t border-hair first:border-t-0" data-remark={number}>
      <button
        type="button"
        aria-expanded={isChosen}
        aria-controls={detailsId}
        onClick={onToggle}
        className="flex w-full items-start gap-2.5 px-3.5 py-2 text-left hover:text-petrol"
      >
        <span
          className={classNames(
            'mt-0.5 min-w-7 shrink-0 rounded border px-1 text-center text-[0.8125rem] leading-5 font-semibold',
            isChosen
              ? 'border-red bg-red text-sheet'
              : isSettled
                ? 'border-ink-soft text-ink-soft'
                : 'border-ink bg-ink text-sheet',
          )}
        >
          {number}
        </span>
        <span className="min-w-0">
          <span className={classNames('block whitespace-pre-wrap', !isChosen && 'line-clamp-3')}>{body}</span>
          <span className="block text-sm text-ink-soft">
            {author.you ? 'You' : author.name}, <Moment iso={createdAt} />
            {replies.length > 0 && ` · ${replies.length} ${replies.length === 1 ? 'answer' : 'answers'}`}
            {isSettled && ' · settled'}
          </span>
        </span>
      </button>
      {isChosen && (
        <div id={detailsId} className="grid gap-2.5 pr-3.5 pb-3.5 pl-13">
          {replies.map((reply) => (
            <div key={reply.id} className="border-l-2 border-hair pl-2.5">
              <p className="whitespace-pre-wrap">{reply.body}</p>
              <p className="text-sm text-ink-soft">
                {reply.author.you ? 'You' : reply.author.name}, <Moment iso={reply.createdAt} />
              </p>
            </div>
          ))}
          {mayRemark && (
            <RemarkForm
              label={`Answer to remark ${number}`}
              sendLabel="Send answer"
              rows={2}
              asGuest={asGuest}
              onSend={(text, guest) => review.reply(id, text, guest)}
            />
          )}
          {review.settle && <SettleButton remark={remark} settle={review.settle} />}
        </div>
      )}
    </li>
  );
}

interface SettleButtonProps {
  readonly remark: Remark;
  readonly settle: NonNullable<Review['settle']>;
}

function SettleButton({ remark, settle }: SettleButtonProps) {
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const isSettled = remark.resolvedAt !== null;
  const run = async () => {
    setBusy(true);
    setFault(null);
    try {
      await settle(remark.id, !isSettled);
    } catch (error) {
      setFault(sayError(error));
    } finally {
      setBusy(false);
    }
  };
  return (
    <div>
      <Button size="small" busy={busy} onClick={() => void run()}>
        {isSettled ? 'Open again' : 'Settle this remark'}
      </Button>
      {fault && (
        <p role="alert" className="mt-1 text-sm text-red">
          {fault}
        </p>
      )}
    </div>
  );
}
