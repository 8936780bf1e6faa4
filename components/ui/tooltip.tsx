'use client';

import { Tooltip as Primitive } from 'radix-ui';
import type { ReactElement, ReactNode } from 'react';

export function TooltipProvider({ children }: { children: ReactNode }) {
  return <Primitive.Provider delayDuration={400}>{children}</Primitive.Provider>;
}

interface TooltipProps {
  content: ReactNode;
  side?: 'top' | 'right' | 'bottom' | 'left';
  /** One element that can take a ref. */
  children: ReactElement;
}

/** A word of help on hover or focus. It repeats or adds to a name, it never carries one alone. */
export function Tooltip({ content, side = 'bottom', children }: TooltipProps) {
  return (
    <Primitive.Root>
      <Primitive.Trigger asChild>{children}</Primitive.Trigger>
      <Primitive.Portal>
        <Primitive.Content
          side={side}
          sideOffset={5}
          collisionPadding={8}
          className="z-50 max-w-64 rounded border border-rule bg-ink px-2 py-1 text-sm text-sheet"
        >
          {content}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
