'use client';

import { useEffect, useRef } from 'react';
import { classNames } from '@/components/ui/class-names';
import { Moment } from '@/components/ui/moment';
import type { Review } from '@/lib/client/use-review';
import type { Person, Remark } from '@/lib/contracts/remarks';
import { RemarkCare } from './remark-care';
import { isOverdue } from './remark-filter';
import { RemarkForm } from './remark-form';
import { RemarkPictures } from './remark-pictures';
import { SettleButton } from './settle-button';

const today = (): string => new Date().toISOString().slice(0, 10);

interface OneRemarkProps {
  readonly review: Review;
  readonly mayRemark: boolean;
  readonly asGuest: boolean;
  readonly people: readonly Person[];
  readonly number: number;
  readonly remark: Remark;
  readonly isChosen: boolean;
  readonly onToggle: () => void;
}

/** A remark in the list: closed in a few lines, open with its pictures, answers and what can be done with it. */
export function OneRemark({ remark, isChosen, onToggle, review, mayRemark, asGuest, people, ...page }: OneRemarkProps) {
  const { id, number, author, body, createdAt, replies, resolvedAt, unread, assignee, dueOn, revisionNumber } = remark;
  const isSettled = resolvedAt !== null;
  const { markRead } = review;
  const row = useRef<HTMLLIElement>(null);
  useEffect(() => {
    if (!isChosen) return;
    // A pin that is pressed on the drawing brings its words into view, wherever the page is scrolled to.
    row.current?.scrollIntoView?.({ block: 'nearest' });
    // Not read is no harm: the mark stays until the next time.
    if (unread) markRead?.(id).catch(() => undefined);
  }, [isChosen, unread, id, markRead]);
  const detailsId = `remark-${id}`;
  return (
    <li ref={row} className="border-t border-hair first:border-t-0" data-remark={number}>
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
            {unread && <strong className="font-semibold text-petrol">New · </strong>}
            {author.you ? 'You' : author.name}, <Moment iso={createdAt} />
            {replies.length > 0 && ` · ${replies.length} ${replies.length === 1 ? 'answer' : 'answers'}`}
            {isSettled && ' · settled'}
            {revisionNumber !== page.number && ` · from rev ${revisionNumber}`}
            {assignee && ` · given to ${assignee.name}`}
            {dueOn && <span className={isOverdue(remark, today()) ? 'text-red' : undefined}> · due {dueOn}</span>}
          </span>
        </span>
      </button>
      {isChosen && (
        <div id={detailsId} className="grid gap-2.5 pr-3.5 pb-3.5 pl-13">
          <RemarkPictures remark={remark} review={review} />
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
              people={people}
              onSend={(said, guest) => review.reply(id, said, guest)}
            />
          )}
          {review.assign && <RemarkCare remark={remark} people={people} assign={review.assign} />}
          {review.settle && <SettleButton remark={remark} settle={review.settle} />}
        </div>
      )}
    </li>
  );
}
