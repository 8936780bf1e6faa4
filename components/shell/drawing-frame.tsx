import type { ReactNode } from 'react';

const COLUMNS = ['1', '2', '3', '4', '5', '6'];
const ROWS = ['A', 'B', 'C', 'D'];

/** The border of a drawing sheet with its zone marks, for pages that stand before the work. */
export function DrawingFrame({ children }: { children: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col bg-paper p-2 sm:p-4">
      <div className="grid flex-1 grid-cols-[1.25rem_minmax(0,1fr)_1.25rem] grid-rows-[1.25rem_minmax(0,1fr)_1.25rem] border border-rule bg-sheet text-center text-xs text-ink-soft max-sm:grid-cols-[0_minmax(0,1fr)_0] max-sm:grid-rows-[0_minmax(0,1fr)_0] [&_.zone]:max-sm:hidden">
        <span />
        <Zones marks={COLUMNS} />
        <span />
        <Zones marks={ROWS} upright />
        <div className="relative min-w-0 overflow-hidden border border-rule text-left text-base text-ink max-sm:border-0">
          {children}
        </div>
        <Zones marks={ROWS} upright />
        <span />
        <Zones marks={COLUMNS} />
        <span />
      </div>
    </div>
  );
}

function Zones({ marks, upright = false }: { marks: string[]; upright?: boolean }) {
  return (
    <div aria-hidden className={upright ? 'zone flex flex-col' : 'zone flex'}>
      {marks.map((mark) => (
        <span
          key={mark}
          className={
            upright
              ? 'flex flex-1 items-center justify-center border-t border-rule first:border-t-0'
              : 'flex flex-1 items-center justify-center border-l border-rule first:border-l-0'
          }
        >
          {mark}
        </span>
      ))}
    </div>
  );
}
