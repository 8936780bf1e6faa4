import type { ReactNode, RefCallback } from 'react';

/** The height of a drawing before it is measured, and the least after, px. */
export const LEAST_HEIGHT_PX = 240;

interface TrioPanelProps {
  readonly title: ReactNode;
  readonly aside: ReactNode;
  readonly foot: ReactNode;
  readonly measure?: RefCallback<HTMLElement>;
  readonly height?: number;
  readonly children: ReactNode;
}

/** One of the three drawings between its title and its key. */
export function TrioPanel({ title, aside, foot, measure, height, children }: TrioPanelProps) {
  return (
    <section className="min-w-0 border border-rule bg-sheet">
      <div className="flex h-9 items-center justify-between gap-3 border-b border-rule px-3">
        <h2 className="min-w-0 truncate text-[0.9375rem] font-semibold">{title}</h2>
        <div className="flex flex-none items-center gap-2 text-sm">{aside}</div>
      </div>
      <div ref={measure} style={{ height: height ?? LEAST_HEIGHT_PX }}>
        {children}
      </div>
      <div className="flex min-h-8 items-center gap-2.5 border-t border-hair px-3 py-1 text-[0.8125rem] text-ink-soft">
        {foot}
      </div>
    </section>
  );
}
