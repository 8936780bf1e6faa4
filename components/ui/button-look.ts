import { classNames } from './class-names';

export type ButtonVariant = 'action' | 'plain' | 'quiet' | 'danger';
export type ButtonSize = 'small' | 'medium' | 'large' | 'icon';

const VARIANTS: Record<ButtonVariant, string> = {
  action: 'border-petrol bg-petrol text-on-petrol font-medium hover:bg-ink hover:border-ink hover:text-sheet',
  plain: 'border-rule bg-sheet text-ink font-medium hover:bg-petrol-wash hover:border-petrol',
  quiet: 'border-transparent bg-transparent text-ink hover:text-petrol hover:bg-petrol-wash',
  danger: 'border-red bg-sheet text-red font-medium hover:bg-red hover:text-sheet',
};

const SIZES: Record<ButtonSize, string> = {
  small: 'min-h-8 px-2.5 text-sm pointer-coarse:min-h-11',
  medium: 'min-h-9 px-3.5 text-[0.9375rem] pointer-coarse:min-h-11',
  large: 'min-h-12 px-5 text-base font-semibold',
  icon: 'size-8 text-sm pointer-coarse:size-11',
};

/** The look that buttons and links in a button's clothes share. */
export function buttonLook(variant: ButtonVariant, size: ButtonSize, className?: string): string {
  return classNames(
    'inline-flex shrink-0 items-center justify-center gap-2 rounded border whitespace-nowrap transition-colors select-none',
    'disabled:pointer-events-none disabled:opacity-45 aria-disabled:pointer-events-none aria-disabled:opacity-45',
    VARIANTS[variant],
    SIZES[size],
    className,
  );
}
