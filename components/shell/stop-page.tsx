import type { ReactNode } from 'react';
import { Wordmark } from '@/components/ui/wordmark';
import { DrawingFrame } from './drawing-frame';

interface StopPageProps {
  title: string;
  children: ReactNode;
  actions: ReactNode;
}

/** A page that can only say why it is not the one asked for, and the way on. */
export function StopPage({ title, children, actions }: StopPageProps) {
  return (
    <DrawingFrame>
      <main className="flex min-h-full max-w-lg flex-col justify-center gap-4 p-6 sm:p-12">
        <Wordmark className="mb-4" />
        <h1 className="text-2xl font-semibold">{title}</h1>
        <div className="text-ink-soft">{children}</div>
        <div className="flex flex-wrap gap-2">{actions}</div>
      </main>
    </DrawingFrame>
  );
}
