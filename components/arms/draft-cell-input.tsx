'use client';

import { classNames } from '@/components/ui/class-names';
import type { DraftCell } from '@/lib/editor/arm/draft';

interface DraftCellInputProps {
  path: string;
  label: string;
  cell: DraftCell;
  invalid: boolean;
  onText: (path: string, text: string) => void;
  className?: string;
}

/** Where the sentences about a draft stand, for cells to point at. */
export const PROBLEMS_ID = 'arm-problems';

export const CELL_LOOK =
  'h-8 w-full min-w-0 bg-transparent text-[0.9375rem] text-ink hover:bg-petrol-wash focus-visible:bg-sheet focus-visible:-outline-offset-2 pointer-coarse:h-11 pointer-coarse:text-base';

/** A number in a cell of a table: no frame of its own, red and bold where something is wrong with it. */
export function DraftCellInput({ path, label, cell, invalid, onText, className }: DraftCellInputProps) {
  return (
    <input
      type="text"
      inputMode="text"
      autoComplete="off"
      spellCheck={false}
      data-cell={path}
      aria-label={label}
      aria-invalid={invalid || undefined}
      aria-describedby={invalid ? PROBLEMS_ID : undefined}
      value={cell.text}
      onChange={(event) => onText(path, event.target.value)}
      onFocus={(event) => event.target.select()}
      className={classNames(
        CELL_LOOK,
        'border border-transparent px-[7px] text-right font-mono tabular-nums',
        invalid && 'font-semibold text-red',
        invalid && cell.text === '' && 'border-red',
        className,
      )}
    />
  );
}
