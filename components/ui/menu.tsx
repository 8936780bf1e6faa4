'use client';

import { Check } from 'lucide-react';
import { DropdownMenu } from 'radix-ui';
import type { ReactElement, ReactNode } from 'react';
import { classNames } from './class-names';

interface MenuProps {
  /** One element that can take a ref, such as a Button. */
  trigger: ReactElement;
  align?: 'start' | 'center' | 'end';
  children: ReactNode;
}

/** A list of commands that opens from a button. */
export function Menu({ trigger, align = 'end', children }: MenuProps) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={4}
          collisionPadding={8}
          className="z-50 max-h-(--radix-dropdown-menu-content-available-height) min-w-48 overflow-y-auto rounded border border-rule bg-sheet text-ink"
        >
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

const ITEM =
  'flex min-h-9 items-center gap-2.5 px-3 text-[0.9375rem] no-underline outline-none select-none data-disabled:opacity-45 data-highlighted:bg-petrol-wash pointer-coarse:min-h-11';

interface MenuItemProps {
  onSelect?: () => void;
  disabled?: boolean;
  danger?: boolean;
  icon?: ReactNode;
  /** The keys that do the same. */
  shortcut?: string;
  /** With it the single child (a link) becomes the item. */
  asChild?: boolean;
  children: ReactNode;
}

export function MenuItem({ onSelect, disabled, danger, icon, shortcut, asChild, children }: MenuItemProps) {
  const look = classNames(ITEM, danger && 'text-red');
  if (asChild) {
    return (
      <DropdownMenu.Item asChild disabled={disabled} onSelect={onSelect} className={look}>
        {children}
      </DropdownMenu.Item>
    );
  }
  return (
    <DropdownMenu.Item disabled={disabled} onSelect={onSelect} className={look}>
      {icon}
      <span className="min-w-0 flex-1">{children}</span>
      {shortcut && <kbd className="text-xs text-ink-soft">{shortcut}</kbd>}
    </DropdownMenu.Item>
  );
}

interface MenuChoiceProps<Value extends string> {
  label: string;
  value: Value;
  onValueChange: (value: Value) => void;
  options: readonly { value: Value; label: ReactNode }[];
}

/** A group of which one is ticked. */
export function MenuChoice<Value extends string>({ label, value, onValueChange, options }: MenuChoiceProps<Value>) {
  return (
    <DropdownMenu.RadioGroup value={value} onValueChange={(next) => onValueChange(next as Value)} aria-label={label}>
      {options.map((option) => (
        <DropdownMenu.RadioItem key={option.value} value={option.value} className={ITEM}>
          <span className="size-4 shrink-0">
            <DropdownMenu.ItemIndicator>
              <Check aria-hidden className="size-4 text-petrol" />
            </DropdownMenu.ItemIndicator>
          </span>
          {option.label}
        </DropdownMenu.RadioItem>
      ))}
    </DropdownMenu.RadioGroup>
  );
}

export function MenuRule() {
  return <DropdownMenu.Separator className="border-t border-hair" />;
}

export function MenuHeading({ children }: { children: ReactNode }) {
  return <DropdownMenu.Label className="px-3 py-2 text-sm text-ink-soft">{children}</DropdownMenu.Label>;
}

interface MenuCheckProps {
  checked: boolean;
  onCheckedChange: (checked: boolean) => void;
  children: ReactNode;
}

/** One thing that is on or off; the menu stays open, since there are often several. */
export function MenuCheck({ checked, onCheckedChange, children }: MenuCheckProps) {
  return (
    <DropdownMenu.CheckboxItem
      checked={checked}
      onCheckedChange={onCheckedChange}
      onSelect={(event) => event.preventDefault()}
      className={ITEM}
    >
      <span className="size-4 shrink-0">
        <DropdownMenu.ItemIndicator>
          <Check aria-hidden className="size-4 text-petrol" />
        </DropdownMenu.ItemIndicator>
      </span>
      {children}
    </DropdownMenu.CheckboxItem>
  );
}
