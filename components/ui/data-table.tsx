import { ArrowDown, ArrowUp } from 'lucide-react';
import type { ComponentProps, ReactNode } from 'react';
import { classNames } from './class-names';

interface DataTableProps extends ComponentProps<'table'> {
  /** Read aloud before the table. */
  caption: string;
}

/** A ruled table that scrolls by itself where it is wider than its panel. */
export function DataTable({ caption, className, children, ...rest }: DataTableProps) {
  return (
    // Positioned, so that what is only read aloud scrolls with the table and does not widen the page.
    <div className="relative overflow-x-auto">
      <table {...rest} className={classNames('w-full border-collapse text-left text-[0.9375rem]', className)}>
        <caption className="sr-only">{caption}</caption>
        {children}
      </table>
    </div>
  );
}

/** Head of a column; `figures` aligns right as the numbers below it do. */
export function HeadCell({ figures, className, ...rest }: ComponentProps<'th'> & { figures?: boolean }) {
  return (
    <th
      scope="col"
      {...rest}
      className={classNames(
        'h-8 px-3 text-[0.8125rem] font-medium whitespace-nowrap text-ink-soft first:pl-3.5 last:pr-3.5',
        figures && 'text-right',
        className,
      )}
    />
  );
}

interface SortHeadCellProps {
  direction: 'asc' | 'desc' | false;
  onSort: (event: unknown) => void;
  figures?: boolean;
  className?: string;
  children: ReactNode;
}

/** A head that sorts its column; says the direction aloud. */
export function SortHeadCell({ direction, onSort, figures, className, children }: SortHeadCellProps) {
  const Arrow = direction === 'desc' ? ArrowDown : ArrowUp;
  return (
    <HeadCell
      figures={figures}
      aria-sort={direction === 'asc' ? 'ascending' : direction === 'desc' ? 'descending' : 'none'}
      className={className}
    >
      <button
        type="button"
        onClick={onSort}
        className={classNames(
          '-mx-1 inline-flex min-h-8 items-center gap-1 px-1 hover:text-petrol pointer-coarse:min-h-11',
          figures && 'flex-row-reverse',
          direction && 'text-ink',
        )}
      >
        {children}
        <Arrow aria-hidden className={classNames('size-3.5', !direction && 'invisible')} />
      </button>
    </HeadCell>
  );
}

/** A row under a hair rule. */
export function DataRow({ className, ...rest }: ComponentProps<'tr'>) {
  return <tr {...rest} className={classNames('border-t border-hair', className)} />;
}

/** A cell; `figures` sets it right-aligned in the mono face. */
export function DataCell({ figures, className, ...rest }: ComponentProps<'td'> & { figures?: boolean }) {
  return (
    <td
      {...rest}
      className={classNames(
        'h-10 px-3 py-1.5 align-middle first:pl-3.5 last:pr-3.5',
        figures && 'text-right font-mono whitespace-nowrap tabular-nums',
        className,
      )}
    />
  );
}
