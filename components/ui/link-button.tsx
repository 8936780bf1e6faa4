import Link from 'next/link';
import type { ComponentProps } from 'react';
import { buttonLook, type ButtonSize, type ButtonVariant } from './button-look';
import { classNames } from './class-names';

interface LinkButtonProps extends ComponentProps<typeof Link> {
  variant?: ButtonVariant;
  size?: ButtonSize;
}

/** A link that looks like a button. */
export function LinkButton({ variant = 'plain', size = 'medium', className, ...rest }: LinkButtonProps) {
  return <Link {...rest} className={buttonLook(variant, size, className)} />;
}

/** A link in running text or in a table. */
export function TextLink({ className, ...rest }: ComponentProps<typeof Link>) {
  return (
    <Link
      {...rest}
      className={classNames(
        'text-petrol underline decoration-petrol/40 underline-offset-[3px] hover:decoration-petrol',
        className,
      )}
    />
  );
}
