'use client';

import { Toaster as Sonner, toast } from 'sonner';

export { toast };

/** Short news at the lower edge: saved, sent, revoked. Trouble that needs an answer belongs in a Notice instead. */
export function Toaster() {
  return (
    <Sonner
      position="bottom-center"
      duration={5000}
      // It brings a typeface of its own, stronger than a class.
      style={{ fontFamily: 'inherit' }}
      toastOptions={{
        unstyled: true,
        classNames: {
          toast:
            'flex w-full items-center gap-3 rounded border border-rule bg-sheet px-3.5 py-2.5 text-[0.9375rem] text-ink',
          title: 'font-medium',
          description: 'text-sm text-ink-soft',
          error: 'border-l-4 border-l-red',
          success: 'border-l-4 border-l-green',
          icon: 'hidden',
          actionButton: 'ml-auto min-h-8 px-2 font-medium text-petrol underline underline-offset-2',
        },
      }}
    />
  );
}
