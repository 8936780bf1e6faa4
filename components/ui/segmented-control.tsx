'use client';

import { RadioGroup } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from './class-names';

interface SegmentedControlProps<Value extends string> {
  /** Read aloud as the group's name. */
  label: string;
  value: Value;
  onValueChange: (value: Value) => void;
  options: readonly { value: Value; label: ReactNode; disabled?: boolean }[];
  disabled?: boolean;
  className?: string;
}

/** Two to four choices side by side; the chosen one is inked. */
export function SegmentedControl<Value extends string>({
  label,
  value,
  onValueChange,
  options,
  disabled,
  className,
}: SegmentedControlProps<Value>) {
  return (
    <RadioGroup.Root
      aria-label={label}
      value={value}
      onValueChange={(next) => onValueChange(next as Value)}
      disabled={disabled}
      orientation="horizontal"
      className={classNames('inline-flex max-w-full rounded border border-rule bg-sheet', className)}
    >
      {options.map((option) => (
        <RadioGroup.Item
          key={option.value}
          value={option.value}
          disabled={option.disabled}
          className="min-h-8 min-w-0 flex-auto truncate border-l border-rule px-2.5 text-sm text-ink first:border-l-0 not-data-[state=checked]:hover:bg-petrol-wash disabled:opacity-45 data-[state=checked]:bg-ink data-[state=checked]:text-sheet pointer-coarse:min-h-11"
        >
          {option.label}
        </RadioGroup.Item>
      ))}
    </RadioGroup.Root>
  );
}
