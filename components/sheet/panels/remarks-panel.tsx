'use client';

import { useEffect, useRef, useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/text-input';
import { sayError } from '@/lib/client/fetcher';
import type { LayoutRemarks } from '@/lib/client/use-remarks';
import type { Remark } from '@/lib/contracts/remarks';

interface RemarksPanelProps extends LayoutRemarks {
  readonly chosenId: string | null;
  /** Opens a remark here and shows its pin; null closes it. */
  readonly onChoose: (remarkId: string | null) => void;
}

/** What reviewers said about the issued revisions, open ones first. */
export function RemarksPanel({ remarks, error, chosenId, onChoose, answer, resolve }: RemarksPanelProps) {
  const [withResolved, setWithResolved] = useState(false);
  const all = remarks ?? [];
  const open = all.filter(({ resolvedAt }) => !resolvedAt);
  const settled = all.length - open.length;
  const shown = withResolved ? [...open, ...all.filter(({ resolvedAt }) => resolvedAt)] : open;
  const chosenSettled = all.find(({ id, resolvedAt }) => id === chosenId && resolvedAt);
  const listed = chosenSettled && !shown.includes(chosenSettled) ? [...shown, chosenSettled] : shown;
  return (
    <section aria-labelledby="remarks-title" className="px-3.5 pt-3 pb-4">
      <div className="flex items-center justify-between">
        <h2 id="remarks-title" className="text-[0.8125rem] font-medium text-ink-soft">
          Remarks
        </h2>
        {settled > 0 && (
          <Button variant="quiet" size="small" className="-mr-2.5" onClick={() => setWithResolved(!withResolved)}>
            {withResolved ? 'Hide settled' : `Show ${settled} settled`}
          </Button>
        )}
      </div>
      {error && <p className="text-sm text-red">{error.message}</p>}
      {remarks && all.length === 0 && (
        <p className="mt-1 text-sm text-ink-soft">
          None yet. Issue the sheet and share the revision; what reviewers pin to it appears here.
        </p>
      )}
      {remarks && all.length > 0 && listed.length === 0 && <p className="mt-1 text-sm text-ink-soft">All settled.</p>}
      <ul className="mt-1">
        {listed.map((remark) => (
          <OneRemark
            key={remark.id}
            remark={remark}
            isChosen={remark.id === chosenId}
            onToggle={() => onChoose(remark.id === chosenId ? null : remark.id)}
            answer={answer}
            resolve={resolve}
          />
        ))}
      </ul>
    </section>
  );
}

interface OneRemarkProps extends Pick<LayoutRemarks, 'answer' | 'resolve'> {
  readonly remark: Remark;
  readonly isChosen: boolean;
  readonly onToggle: () => void;
}

const DAY = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', hour: '2-digit', minute: '2-digit' });
const when = (timestamp: string) => DAY.format(new Date(timestamp));

function OneRemark({ remark, isChosen, onToggle, answer, resolve }: OneRemarkProps) {
  const { number, body, author, replies, resolvedAt, revisionNumber, createdAt } = remark;
  const detailsId = `remark-${remark.id}`;
  const row = useRef<HTMLLIElement>(null);
  // A pin that is pressed on the drawing opens its remark, wherever the list is scrolled to.
  useEffect(() => {
    if (isChosen) row.current?.scrollIntoView({ block: 'nearest' });
  }, [isChosen]);
  return (
    <li ref={row} className="border-t border-hair first:border-t-0" data-remark={number}>
      <button
        type="button"
        aria-expanded={isChosen}
        aria-controls={detailsId}
        onClick={onToggle}
        className="flex w-full items-start gap-2.5 py-1.5 text-left hover:text-petrol"
      >
        <span
          className={classNames(
            'mt-0.5 min-w-5.5 shrink-0 px-1 text-center text-[0.8125rem] leading-5 font-semibold text-sheet',
            resolvedAt ? 'bg-ink-soft' : 'bg-ink',
          )}
        >
          {number}
        </span>
        <span className="min-w-0">
          <span className={classNames('block', !isChosen && 'line-clamp-2')}>{body}</span>
          <span className="block text-[0.8125rem] text-ink-soft">
            {author.you ? 'You' : author.name}, {when(createdAt)}, rev. {revisionNumber}
            {replies.length > 0 && `, ${replies.length} ${replies.length === 1 ? 'answer' : 'answers'}`}
            {resolvedAt && ', settled'}
          </span>
        </span>
      </button>
      <div id={detailsId} hidden={!isChosen} className="pb-3 pl-8">
        {replies.map((reply) => (
          <div key={reply.id} className="border-t border-hair py-1.5 text-sm">
            <p className="whitespace-pre-wrap">{reply.body}</p>
            <p className="text-[0.8125rem] text-ink-soft">
              {reply.author.you ? 'You' : reply.author.name}, {when(reply.createdAt)}
            </p>
          </div>
        ))}
        {isChosen && <AnswerForm remark={remark} answer={answer} resolve={resolve} />}
      </div>
    </li>
  );
}

function AnswerForm({ remark, answer, resolve }: Omit<OneRemarkProps, 'isChosen' | 'onToggle'>) {
  const [text, setText] = useState('');
  const [busy, setBusy] = useState<'answer' | 'resolve' | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const run = async (what: 'answer' | 'resolve', act: () => Promise<void>) => {
    setBusy(what);
    setFault(null);
    try {
      await act();
      if (what === 'answer') setText('');
    } catch (error) {
      setFault(sayError(error));
    } finally {
      setBusy(null);
    }
  };
  return (
    <form
      className="grid gap-2 pt-1"
      onSubmit={(event) => {
        event.preventDefault();
        void run('answer', () => answer(remark.id, text));
      }}
    >
      <Field label={`Answer to remark ${remark.number}`} labelHidden error={fault}>
        <TextArea
          rows={2}
          maxLength={4000}
          placeholder="Answer"
          value={text}
          onChange={(event) => setText(event.target.value)}
        />
      </Field>
      <div className="flex gap-2">
        <Button type="submit" size="small" variant="action" busy={busy === 'answer'} disabled={text.trim() === ''}>
          Send answer
        </Button>
        <Button
          size="small"
          busy={busy === 'resolve'}
          onClick={() => run('resolve', () => resolve(remark.id, !remark.resolvedAt))}
        >
          {remark.resolvedAt ? 'Open again' : 'Settle'}
        </Button>
      </div>
    </form>
  );
}
