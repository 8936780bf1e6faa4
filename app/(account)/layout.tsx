import type { ReactNode } from 'react';
import { ArmElevation } from '@/components/shell/arm-elevation';
import { DrawingFrame } from '@/components/shell/drawing-frame';
import { Wordmark } from '@/components/ui/wordmark';

/** Pages before the work starts: a drawing sheet with the form where a drawing has its title block. */
export default function AccountLayout({ children }: { children: ReactNode }) {
  return (
    <DrawingFrame>
      <ArmElevation className="pointer-events-none absolute inset-0 hidden size-full lg:block" />
      <main className="relative flex min-h-full flex-col justify-start gap-5 p-4 sm:mx-auto sm:max-w-md sm:justify-center lg:mx-0 lg:ml-auto lg:w-[27rem] lg:max-w-none lg:p-8">
        <Wordmark className="py-2" />
        {children}
        <p className="text-sm text-ink-soft">
          See how evenly and how fast every arm can move, spot by spot on the real floor, before steel is cut.
        </p>
      </main>
    </DrawingFrame>
  );
}
