'use client';

import { Check, ChevronDown } from 'lucide-react';
import { Select as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from './class-names';
import { CONTROL_LOOK } from './control-look';
import { useFieldWiring } from './field-context';

export interface SelectOption<Value extends string> {
  value: Value;
  label: ReactNode;
  /** A second, softer line. */
  note?: ReactNode;
  disabled?: boolean;
}

interface SelectProps<Value extends string> {
  value: Value | undefined;
  onValueChange: (value: Value) => void;
  options: readonly SelectOption<Value>[];
  placeholder?: string;
  disabled?: boolean;
  className?: string;
  id?: string;
  'aria-label'?: string;
}

/** One of several. Inside a Field it takes the field's label; elsewhere give it an aria-label. Values may not be empty. */
export function Select<Value extends string>({
  value,
  onValueChange,
  options,
  placeholder = 'Choose',
  disabled,
  className,
  ...rest
}: SelectProps<Value>) {
  const wiring = useFieldWiring(rest);
  return (
    <Primitive.Root value={value ?? ''} onValueChange={(next) => onValueChange(next as Value)} disabled={disabled}>
      <Primitive.Trigger
        {...wiring}
        aria-label={rest['aria-label']}
        className={classNames(CONTROL_LOOK, 'inline-flex items-center justify-between gap-2 text-left', className)}
      >
        <span className="min-w-0 truncate">
          <Primitive.Value placeholder={<span className="text-ink-soft">{placeholder}</span>} />
        </span>
        <Primitive.Icon>
          <ChevronDown aria-hidden className="size-4 shrink-0" />
        </Primitive.Icon>
      </Primitive.Trigger>
      <Primitive.Portal>
        <Primitive.Content
          position="popper"
          sideOffset={2}
          className="z-50 max-h-(--radix-select-content-available-height) min-w-(--radix-select-trigger-width) max-w-[min(28rem,92vw)] overflow-hidden rounded border border-rule bg-sheet text-ink"
        >
          <Primitive.Viewport>
            {options.map((option) => (
              <Primitive.Item
                key={option.value}
                value={option.value}
                disabled={option.disabled}
                className="flex min-h-8 items-center gap-2 px-2.5 py-1.5 text-[0.9375rem] outline-none select-none data-disabled:opacity-45 data-highlighted:bg-petrol-wash pointer-coarse:min-h-11"
              >
                <span className="size-4 shrink-0">
                  <Primitive.ItemIndicator>
                    <Check aria-hidden className="size-4 text-petrol" />
                  </Primitive.ItemIndicator>
                </span>
                <span className="min-w-0">
                  <Primitive.ItemText>{option.label}</Primitive.ItemText>
                  {option.note && <span className="block text-sm text-ink-soft">{option.note}</span>}
                </span>
              </Primitive.Item>
            ))}
          </Primitive.Viewport>
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
