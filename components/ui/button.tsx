import type { ComponentProps, ReactNode } from 'react';
import { buttonLook, type ButtonSize, type ButtonVariant } from './button-look';

interface ButtonProps extends ComponentProps<'button'> {
  variant?: ButtonVariant;
  size?: ButtonSize;
  /** Shown in place of the label while the work it started goes on; the button then takes no second press. */
  busyLabel?: ReactNode;
  busy?: boolean;
}

/** A button. `size="icon"` needs an aria-label. */
export function Button({
  variant = 'plain',
  size = 'medium',
  busy = false,
  busyLabel,
  type = 'button',
  className,
  children,
  disabled,
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      disabled={disabled || busy}
      aria-busy={busy || undefined}
      className={buttonLook(variant, size, className)}
    >
      {busy && busyLabel ? busyLabel : children}
    </button>
  );
}
