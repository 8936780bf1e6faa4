'use client';

import { useState, type ComponentProps, type KeyboardEvent } from 'react';
import { classNames } from './class-names';
import { CONTROL_LOOK } from './control-look';
import { useFieldWiring } from './field-context';
import { useMillimetres } from './millimetres-context';
import { parseNumber } from './parse-number';

type Passed = Omit<ComponentProps<'input'>, 'value' | 'defaultValue' | 'onChange' | 'type' | 'step' | 'min' | 'max'>;

interface NumberInputProps extends Passed {
  value: number | null;
  unit?: string;
  /** Every readable change; null when the text is empty or no number. */
  onValueChange?: (value: number | null) => void;
  /** The finished value: on Enter, on leaving, on an arrow key. Not called while the text is no number. */
  onCommit?: (value: number) => void;
  /** What an arrow key adds; Shift makes it ten times that. */
  step?: number;
  min?: number;
  max?: number;
  /** Most decimals shown; trailing zeros are not written. */
  decimals?: number;
}

const show = (value: number | null, decimals: number): string =>
  value === null || !Number.isFinite(value) ? '' : String(Number(value.toFixed(decimals)));

/**
 * A number with its unit. A length in mm is shown and read in the reader's own unit, takes `2.5 m`, `98 in` and sums, and hands
 * over millimetres. The text being typed is kept as typed until the field is left.
 */
export function NumberInput({
  value,
  unit: givenUnit,
  onValueChange,
  onCommit,
  step: givenStep = 1,
  min = -Infinity,
  max = Infinity,
  decimals: givenDecimals = 3,
  className,
  onBlur,
  onKeyDown,
  ...rest
}: NumberInputProps) {
  const [draft, setDraft] = useState<string | null>(null);
  const chosen = useMillimetres();
  const length = givenUnit === 'mm' ? chosen : null;
  const unit = length?.unit ?? givenUnit;
  const perUnit = length?.mmPerUnit ?? 1;
  const decimals = givenDecimals + (length?.moreDecimals ?? 0);
  const step = length ? length.step(givenStep) : givenStep;
  const shown = show(value === null ? null : value / perUnit, decimals);
  /** What stands in the field and was not touched is the value itself, to the last digit. */
  const read = (text: string): number | null => {
    if (text.trim() === shown && value !== null) return value;
    return length ? length.read(text) : parseNumber(text);
  };
  const clamp = (number: number) => Math.min(max, Math.max(min, number));

  const settle = (): void => {
    if (draft === null) return;
    const typed = read(draft);
    if (typed === null) {
      if (onCommit || draft.trim() === '') setDraft(null);
      return;
    }
    setDraft(null);
    const settled = clamp(typed);
    if (onValueChange && settled !== typed) onValueChange(settled);
    if (settled !== value) onCommit?.(settled);
    else if (onValueChange) onCommit?.(settled);
  };

  const nudge = (event: KeyboardEvent<HTMLInputElement>): void => {
    const direction = event.key === 'ArrowUp' ? 1 : event.key === 'ArrowDown' ? -1 : 0;
    const from = draft === null ? value : read(draft);
    if (!direction || from === null) return;
    event.preventDefault();
    const to = clamp(Number((from + direction * step * (event.shiftKey ? 10 : 1)).toFixed(6)));
    setDraft(null);
    onValueChange?.(to);
    onCommit?.(to);
  };

  return (
    <span className={classNames('relative block min-w-0', className)}>
      <input
        {...rest}
        {...useFieldWiring(rest)}
        type="text"
        inputMode={length ? 'text' : 'decimal'}
        autoComplete="off"
        value={draft ?? shown}
        onChange={(event) => {
          setDraft(event.target.value);
          onValueChange?.(read(event.target.value));
        }}
        onBlur={(event) => {
          settle();
          onBlur?.(event);
        }}
        onKeyDown={(event) => {
          onKeyDown?.(event);
          if (event.defaultPrevented) return;
          if (event.key === 'Enter') settle();
          if (event.key === 'Escape' && draft !== null) setDraft(null);
          nudge(event);
        }}
        className={classNames(
          CONTROL_LOOK,
          'text-right font-mono tabular-nums',
          unit && (unit.length > 2 ? 'pr-12' : 'pr-9'),
        )}
      />
      {unit && (
        <span
          aria-hidden
          className="pointer-events-none absolute inset-y-0 right-2.5 flex items-center text-sm text-ink-soft"
        >
          {unit}
        </span>
      )}
    </span>
  );
}
