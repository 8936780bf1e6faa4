'use client';

import { useId, useState } from 'react';
import { classNames } from '@/components/ui/class-names';
import { useUnits } from '@/lib/client/use-units';
import { parseMeasure, printed } from '@/lib/editor/measure-text';

interface OptionalFieldProps {
  readonly label: string;
  readonly value: number | null;
  readonly kind: 'length' | 'number';
  readonly unit?: string;
  /** Asked in red under the empty field: what to find out. */
  readonly question?: string;
  /** Takes the value, null for an emptied field. Answers why it cannot be taken. */
  readonly onCommit: (value: number | null) => string | null;
  readonly disabled?: boolean;
  readonly className?: string;
}

/** A value that may be unknown. Empty stays empty: nothing is put in its place, and what hangs on it asks for it here. */
export function OptionalField(props: OptionalFieldProps) {
  const { label, value, kind, question, onCommit, disabled, className } = props;
  const { unit: lengthUnit, figure } = useUnits();
  const unit = props.unit ?? (kind === 'length' ? lengthUnit : '');
  const shown = value === null ? '' : kind === 'length' ? figure(value) : printed(value);
  const id = useId();
  const [draft, setDraft] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const settle = () => {
    if (draft === null) return;
    const text = draft.trim();
    if (text === shown) {
      setFault(null);
      return setDraft(null);
    }
    const parsed = text === '' ? null : parseMeasure(text, kind, lengthUnit);
    if (parsed && !parsed.ok) return setFault(parsed.message);
    const refusal = onCommit(parsed ? parsed.value : null);
    setFault(refusal);
    if (!refusal) setDraft(null);
  };
  const asks = value === null && draft === null && question !== undefined;
  const words = fault ?? (asks ? question : null);
  return (
    <div className={classNames('min-w-0', className)}>
      <label htmlFor={id} className="block text-[0.8125rem] leading-4 text-ink-soft">
        {label}
      </label>
      <span className="relative block">
        <input
          id={id}
          type="text"
          inputMode="decimal"
          autoComplete="off"
          placeholder="not known"
          disabled={disabled}
          aria-invalid={words ? true : undefined}
          aria-describedby={words ? `${id}-words` : undefined}
          value={draft ?? shown}
          onChange={(event) => {
            setDraft(event.target.value);
            setFault(null);
          }}
          onBlur={settle}
          onKeyDown={(event) => {
            if (event.key === 'Enter') settle();
            if (event.key === 'Escape' && draft !== null) {
              event.stopPropagation();
              setDraft(null);
              setFault(null);
            }
          }}
          className={classNames(
            'h-7 w-full min-w-0 border-0 border-b border-ink-soft bg-transparent pl-0 text-right font-mono text-sm tabular-nums',
            'placeholder:font-sans placeholder:text-ink-soft hover:border-ink focus-visible:border-petrol focus-visible:bg-petrol-wash',
            'aria-invalid:border-red disabled:border-hair disabled:text-ink-soft pointer-coarse:h-11 pointer-coarse:text-base',
            unit.length > 1 ? (unit.length > 3 ? 'pr-10' : 'pr-7') : unit ? 'pr-3.5' : 'pr-0.5',
          )}
        />
        {unit && (
          <span
            aria-hidden
            className="pointer-events-none absolute inset-y-0 right-0.5 flex items-center text-[0.8125rem] text-ink-soft"
          >
            {unit}
          </span>
        )}
      </span>
      {words && (
        <p
          id={`${id}-words`}
          role={fault ? 'alert' : undefined}
          className="mt-0.5 text-[0.8125rem] leading-4 font-medium text-red"
        >
          {words}
        </p>
      )}
    </div>
  );
}
