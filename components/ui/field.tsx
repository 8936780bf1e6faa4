'use client';

import { useId, useMemo, type ReactNode } from 'react';
import { classNames } from './class-names';
import { FieldContext } from './field-context';

interface FieldProps {
  label: ReactNode;
  /** One line under the control that says what is wanted. */
  hint?: ReactNode;
  /** What is wrong and what to do; announced when it appears. */
  error?: ReactNode;
  required?: boolean;
  /** Label and control on one line, for the narrow panels beside the sheet. */
  inline?: boolean;
  /** The label is read aloud, not drawn. */
  labelHidden?: boolean;
  className?: string;
  children: ReactNode;
}

/** A labelled control; TextInput, NumberInput, Select and TextArea inside it find their wiring by themselves. */
export function Field({
  label,
  hint,
  error,
  required = false,
  inline = false,
  labelHidden = false,
  className,
  children,
}: FieldProps) {
  const id = useId();
  const describedBy = [hint ? `${id}-hint` : null, error ? `${id}-error` : null].filter(Boolean).join(' ') || undefined;
  const wiring = useMemo(
    () => ({ id, describedBy, invalid: Boolean(error), required }),
    [id, describedBy, error, required],
  );
  return (
    <FieldContext value={wiring}>
      <div
        className={classNames(
          'min-w-0',
          inline && 'grid grid-cols-[minmax(0,1fr)_minmax(0,1.2fr)] items-center gap-x-3',
          className,
        )}
      >
        <label
          htmlFor={id}
          className={labelHidden ? 'sr-only' : classNames('block text-sm text-ink-soft', !inline && 'mb-1')}
        >
          {label}
        </label>
        {children}
        {hint && (
          <p id={`${id}-hint`} className={classNames('mt-1 text-sm text-ink-soft', inline && 'col-span-2')}>
            {hint}
          </p>
        )}
        <p
          id={`${id}-error`}
          role="alert"
          className={classNames('text-sm font-medium text-red', error ? 'mt-1' : '', inline && 'col-span-2')}
        >
          {error}
        </p>
      </div>
    </FieldContext>
  );
}
