'use client';

import { useId, useState, type KeyboardEvent } from 'react';
import { classNames } from '@/components/ui/class-names';

interface TextFieldProps {
  readonly label: string;
  readonly value: string;
  /** Takes the words. Answers why they cannot be taken; the sheet then keeps the ones before. */
  readonly onCommit: (value: string) => string | null;
  readonly disabled?: boolean;
  readonly className?: string;
}

/** What a typed text of the sheet shares: a draft while one types, a fault said at the field, Escape for the words before. */
function useTextDraft(value: string, onCommit: TextFieldProps['onCommit']) {
  const [draft, setDraft] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const settle = () => {
    if (draft === null) return;
    const refusal = draft === value ? null : onCommit(draft);
    setFault(refusal);
    if (!refusal) setDraft(null);
  };
  return {
    shown: draft ?? value,
    fault,
    settle,
    onChange: (next: string) => {
      setDraft(next);
      setFault(null);
    },
    onBlur: () => {
      settle();
      setDraft(null);
    },
    onEscape: (event: KeyboardEvent) => {
      if (event.key !== 'Escape' || draft === null) return;
      event.stopPropagation();
      setDraft(null);
      setFault(null);
    },
  };
}

const LOOK =
  'w-full min-w-0 bg-transparent text-sm hover:border-ink focus-visible:border-petrol focus-visible:bg-petrol-wash focus-visible:outline-offset-0 aria-invalid:border-red disabled:border-hair disabled:text-ink-soft pointer-coarse:text-base';

function Fault({ id, words }: { readonly id: string; readonly words: string | null }) {
  return words ? (
    <p id={id} role="alert" className="mt-0.5 text-[0.8125rem] leading-4 font-medium text-red">
      {words}
    </p>
  ) : null;
}

/** One line of words. Enter or leaving the field takes it. */
export function TextLine({ label, value, onCommit, disabled, className }: TextFieldProps) {
  const id = useId();
  const { shown, fault, settle, onChange, onBlur, onEscape } = useTextDraft(value, onCommit);
  return (
    <div className={classNames('min-w-0', className)}>
      <label htmlFor={id} className="block truncate text-[0.8125rem] leading-4 text-ink-soft">
        {label}
      </label>
      <input
        id={id}
        type="text"
        autoComplete="off"
        disabled={disabled}
        value={shown}
        aria-invalid={fault ? true : undefined}
        aria-describedby={fault ? `${id}-fault` : undefined}
        onChange={(event) => onChange(event.target.value)}
        onBlur={onBlur}
        onKeyDown={(event) => (event.key === 'Enter' ? settle() : onEscape(event))}
        className={classNames(LOOK, 'h-7 border-0 border-b border-ink-soft pointer-coarse:h-11')}
      />
      <Fault id={`${id}-fault`} words={fault} />
    </div>
  );
}

/** Several lines of words. Leaving the field takes them, and so does Ctrl Enter. */
export function TextBlock({ label, value, onCommit, disabled, className }: TextFieldProps) {
  const id = useId();
  const { shown, fault, settle, onChange, onBlur, onEscape } = useTextDraft(value, onCommit);
  return (
    <div className={classNames('min-w-0', className)}>
      <label htmlFor={id} className="block truncate text-[0.8125rem] leading-4 text-ink-soft">
        {label}
      </label>
      <textarea
        id={id}
        rows={3}
        disabled={disabled}
        value={shown}
        aria-invalid={fault ? true : undefined}
        aria-describedby={fault ? `${id}-fault` : undefined}
        onChange={(event) => onChange(event.target.value)}
        onBlur={onBlur}
        onKeyDown={(event) => (event.key === 'Enter' && (event.ctrlKey || event.metaKey) ? settle() : onEscape(event))}
        className={classNames(LOOK, 'mt-0.5 resize-y rounded border border-ink-soft px-1.5 py-1')}
      />
      <Fault id={`${id}-fault`} words={fault} />
    </div>
  );
}
