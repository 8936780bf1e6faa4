'use client';

import { X } from 'lucide-react';
import { Dialog as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';
import { buttonLook } from './button-look';
import { classNames } from './class-names';

interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  title: ReactNode;
  description?: ReactNode;
  /** Buttons, right-aligned under a rule. */
  footer?: ReactNode;
  wide?: boolean;
  children?: ReactNode;
}

/** A question that must be answered first. Escape and a press outside close it. */
export function Dialog({ open, onOpenChange, title, description, footer, wide = false, children }: DialogProps) {
  return (
    <Primitive.Root open={open} onOpenChange={onOpenChange}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-40 bg-ink/40 [[data-board=night]_&]:bg-paper/75" />
        <Primitive.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={classNames(
            'fixed top-1/2 left-1/2 z-40 flex max-h-[min(92dvh,52rem)] w-[calc(100vw-1.5rem)] -translate-x-1/2 -translate-y-1/2 flex-col border border-rule bg-sheet text-ink focus-visible:outline-none',
            wide ? 'max-w-2xl' : 'max-w-md',
          )}
        >
          <div className="flex items-center justify-between gap-3 border-b border-rule py-1.5 pr-1.5 pl-4">
            <Primitive.Title className="min-w-0 text-base font-semibold">{title}</Primitive.Title>
            <Primitive.Close aria-label="Close" className={buttonLook('quiet', 'icon')}>
              <X aria-hidden className="size-4" />
            </Primitive.Close>
          </div>
          <div className="min-h-0 overflow-y-auto px-4 py-4">
            {description && (
              <Primitive.Description className={classNames('text-[0.9375rem] text-ink-soft', children ? 'mb-4' : '')}>
                {description}
              </Primitive.Description>
            )}
            {children}
          </div>
          {footer && (
            <div className="flex flex-wrap items-center justify-end gap-2 border-t border-hair px-4 py-3">{footer}</div>
          )}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
