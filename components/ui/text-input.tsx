'use client';

import type { ComponentProps } from 'react';
import { classNames } from './class-names';
import { CONTROL_LOOK } from './control-look';
import { useFieldWiring } from './field-context';

/** One line of text. */
export function TextInput({ className, type = 'text', ...rest }: ComponentProps<'input'>) {
  return <input {...rest} {...useFieldWiring(rest)} type={type} className={classNames(CONTROL_LOOK, className)} />;
}

/** Several lines of text. */
export function TextArea({ className, rows = 4, ...rest }: ComponentProps<'textarea'>) {
  return (
    <textarea
      {...rest}
      {...useFieldWiring(rest)}
      rows={rows}
      className={classNames(CONTROL_LOOK, 'resize-y py-1.5 leading-snug', className)}
    />
  );
}
