import type { ReactNode } from 'react';
import { classNames } from './class-names';

interface PanelProps {
  title?: ReactNode;
  /** Stands at the right end of the title line: a count, a unit, an action. */
  aside?: ReactNode;
  /** The heading's level on its page. */
  level?: 1 | 2 | 3;
  /** Without it the content meets the rules, as tables do. */
  padded?: boolean;
  className?: string;
  id?: string;
  children: ReactNode;
}

/** A ruled panel: a title line, an ink rule, and what stands under it. */
export function Panel({ title, aside, level = 2, padded = false, className, id, children }: PanelProps) {
  const Heading = `h${level}` as const;
  return (
    <section id={id} className={classNames('min-w-0 border border-rule bg-sheet', className)}>
      {(title || aside) && (
        <div className="flex min-h-9 flex-wrap items-center justify-between gap-x-4 gap-y-1 border-b border-rule px-3.5 py-1.5">
          <Heading className="min-w-0 text-[0.9375rem] font-semibold">{title}</Heading>
          {aside && <div className="flex min-w-0 items-center gap-2 text-sm text-ink-soft">{aside}</div>}
        </div>
      )}
      {padded ? <div className="p-3.5">{children}</div> : children}
    </section>
  );
}
