'use client';

import { Check, Minus } from 'lucide-react';
import { Checkbox as Primitive } from 'radix-ui';
import { useId, type ReactNode } from 'react';
import { classNames } from './class-names';

interface CheckboxProps {
  checked: boolean | 'indeterminate';
  onCheckedChange: (checked: boolean) => void;
  label: ReactNode;
  hint?: ReactNode;
  disabled?: boolean;
  className?: string;
}

/** A box to tick, with its label; the whole line takes the press. */
export function Checkbox({ checked, onCheckedChange, label, hint, disabled, className }: CheckboxProps) {
  const id = useId();
  return (
    <div className={classNames('flex min-h-8 items-start gap-2.5 pointer-coarse:min-h-11', className)}>
      <Primitive.Root
        id={id}
        checked={checked}
        onCheckedChange={(next) => onCheckedChange(next === true)}
        disabled={disabled}
        aria-describedby={hint ? `${id}-hint` : undefined}
        className="relative mt-1.5 flex size-5 shrink-0 items-center justify-center rounded border border-ink-soft bg-sheet before:absolute before:-inset-1.5 before:content-[''] hover:border-ink disabled:opacity-50 data-[state=checked]:border-petrol data-[state=checked]:bg-petrol data-[state=checked]:text-on-petrol pointer-coarse:mt-3"
      >
        <Primitive.Indicator>
          {checked === 'indeterminate' ? (
            <Minus aria-hidden className="size-4" />
          ) : (
            <Check aria-hidden className="size-4" />
          )}
        </Primitive.Indicator>
      </Primitive.Root>
      <div className="min-w-0 flex-1">
        <label htmlFor={id} className="flex min-h-8 items-center text-[0.9375rem] pointer-coarse:min-h-11">
          <span>{label}</span>
        </label>
        {hint && (
          <p id={`${id}-hint`} className="text-sm text-ink-soft">
            {hint}
          </p>
        )}
      </div>
    </div>
  );
}
