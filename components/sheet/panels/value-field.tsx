'use client';

import { useId, useState, type KeyboardEvent } from 'react';
import { classNames } from '@/components/ui/class-names';
import { useUnits } from '@/lib/client/use-units';
import { stepIn } from '@/lib/layout/length-units';
import { parseMeasure, printed } from '@/lib/editor/measure-text';

interface ValueFieldProps {
  readonly label: string;
  readonly value: number;
  readonly kind: 'length' | 'angle' | 'number';
  /** Drawn behind the value; an angle has its own, and a length the reader's. */
  readonly unit?: string;
  /** What an arrow key adds; with Shift ten times that. */
  readonly step?: number;
  /** Takes the value. Answers why it cannot be taken; the sheet then keeps the one before. */
  readonly onCommit: (value: number) => string | null;
  readonly disabled?: boolean;
  readonly className?: string;
  /** Marks the field that the list moves the keyboard to. */
  readonly first?: boolean;
}

const UNITS = { angle: '°', number: '' } as const;

/**
 * One typed value of the sheet. Enter or leaving the field takes it. What cannot be taken is said at the field: the typed text
 * stays while one is in the field, and the value of the sheet never changes.
 */
export function ValueField(props: ValueFieldProps) {
  const { label, value, kind, onCommit, disabled, className, first } = props;
  const { unit: lengthUnit, figure } = useUnits();
  const isLength = kind === 'length';
  const unit = props.unit ?? (isLength ? lengthUnit : UNITS[kind]);
  const step = isLength ? stepIn(props.step ?? 10, lengthUnit) : (props.step ?? 10);
  const shown = isLength ? figure(value) : printed(value);
  const id = useId();
  const [draft, setDraft] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);

  /** True where the value is in. */
  const take = (next: number): boolean => {
    const refusal = next === value ? null : onCommit(next);
    setFault(refusal);
    if (!refusal) setDraft(null);
    return !refusal;
  };
  const settle = (text: string | null) => {
    if (text === null) return;
    // Inches are shown rounded: what was not changed must not be stored as it is shown.
    if (text.trim() === shown) {
      setFault(null);
      return setDraft(null);
    }
    const parsed = parseMeasure(text, kind, lengthUnit);
    if (parsed.ok) take(parsed.value);
    else setFault(parsed.message);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    const direction = event.key === 'ArrowUp' ? 1 : event.key === 'ArrowDown' ? -1 : 0;
    if (event.key === 'Enter') settle(draft);
    if (event.key === 'Escape' && draft !== null) {
      event.stopPropagation();
      setDraft(null);
      setFault(null);
    }
    if (!direction) return;
    event.preventDefault();
    const parsed = draft === null || draft.trim() === shown ? null : parseMeasure(draft, kind, lengthUnit);
    const from = parsed?.ok ? parsed.value : value;
    take(Number((from + direction * step * (event.shiftKey ? 10 : 1)).toFixed(4)));
  };

  return (
    <div className={classNames('min-w-0', className)}>
      <label htmlFor={id} className="block truncate text-[0.8125rem] leading-4 text-ink-soft">
        {label}
      </label>
      <span className="relative block">
        <input
          id={id}
          type="text"
          inputMode={kind === 'number' ? 'decimal' : 'text'}
          autoComplete="off"
          spellCheck={false}
          disabled={disabled}
          data-first-value={first || undefined}
          aria-invalid={fault ? true : undefined}
          aria-describedby={fault ? `${id}-fault` : undefined}
          value={draft ?? shown}
          onFocus={(event) => event.target.select()}
          onChange={(event) => {
            setDraft(event.target.value);
            setFault(null);
          }}
          onBlur={() => {
            settle(draft);
            setDraft(null);
          }}
          onKeyDown={onKeyDown}
          className={classNames(
            'h-7 w-full min-w-0 border-0 border-b border-ink-soft bg-transparent pl-0 text-right font-mono text-sm tabular-nums',
            'hover:border-ink focus-visible:border-petrol focus-visible:bg-petrol-wash focus-visible:outline-offset-0',
            'aria-invalid:border-red aria-invalid:text-red disabled:border-hair disabled:text-ink-soft pointer-coarse:h-11 pointer-coarse:text-base',
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
      {fault && (
        <p id={`${id}-fault`} role="alert" className="mt-0.5 text-[0.8125rem] leading-4 font-medium text-red">
          {fault}
        </p>
      )}
    </div>
  );
}
