import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';

const COLUMNS = ['1', '2', '3', '4', '5', '6'];
const ROWS = ['A', 'B', 'C', 'D'];

/** The border of a drawing sheet with its zone marks, for pages that stand before the work. A phone has no room for the marks. */
export function DrawingFrame({ children }: { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh bg-paper p-2 sm:p-4">
      <div className="grid flex-1 border border-rule bg-sheet sm:grid-cols-[1.25rem_minmax(0,1fr)_1.25rem] sm:grid-rows-[1.25rem_minmax(0,1fr)_1.25rem]">
        <Zones marks={COLUMNS} className="col-start-2 row-start-1" />
        <Zones marks={ROWS} className="col-start-1 row-start-2 flex-col" />
        <div className="relative min-w-0 overflow-hidden border-rule sm:col-start-2 sm:row-start-2 sm:border">
          {children}
        </div>
        <Zones marks={ROWS} className="col-start-3 row-start-2 flex-col" />
        <Zones marks={COLUMNS} className="col-start-2 row-start-3" />
      </div>
    </div>
  );
}

function Zones({ marks, className }: { marks: string[]; className: string }) {
  return (
    <div aria-hidden className={classNames('group hidden text-xs text-ink-soft sm:flex', className)}>
      {marks.map((mark) => (
        <span
          key={mark}
          className="flex flex-1 items-center justify-center border-l border-rule first:border-l-0 group-[.flex-col]:border-t group-[.flex-col]:border-l-0 group-[.flex-col]:first:border-t-0"
        >
          {mark}
        </span>
      ))}
    </div>
  );
}
