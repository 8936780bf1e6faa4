'use client';

import { useId, useState } from 'react';

interface NameFieldProps {
  readonly label: string;
  readonly value: string;
  readonly onCommit: (value: string) => string | null;
  readonly disabled?: boolean;
}

/** The name of what is chosen: typed like a value, and kept as it was where it cannot be taken. */
export function NameField({ label, value, onCommit, disabled }: NameFieldProps) {
  const id = useId();
  const [draft, setDraft] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const settle = () => {
    if (draft === null) return;
    const refusal = draft === value ? null : onCommit(draft);
    setFault(refusal);
    if (!refusal) setDraft(null);
  };
  return (
    <div className="min-w-0 flex-1">
      <label htmlFor={id} className="sr-only">
        {label}
      </label>
      <input
        id={id}
        type="text"
        autoComplete="off"
        disabled={disabled}
        value={draft ?? value}
        aria-invalid={fault ? true : undefined}
        aria-describedby={fault ? `${id}-fault` : undefined}
        onChange={(event) => {
          setDraft(event.target.value);
          setFault(null);
        }}
        onBlur={() => {
          settle();
          setDraft(null);
        }}
        onKeyDown={(event) => {
          if (event.key === 'Enter') settle();
          if (event.key !== 'Escape' || draft === null) return;
          event.stopPropagation();
          setDraft(null);
          setFault(null);
        }}
        className="h-7 w-full min-w-0 border-0 border-b border-transparent bg-transparent text-[0.9375rem] font-semibold hover:border-ink-soft focus-visible:border-petrol focus-visible:bg-petrol-wash focus-visible:outline-offset-0 aria-invalid:border-red pointer-coarse:h-11"
      />
      {fault && (
        <p id={`${id}-fault`} role="alert" className="text-[0.8125rem] leading-4 font-medium text-red">
          {fault}
        </p>
      )}
    </div>
  );
}
