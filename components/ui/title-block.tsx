'use client';

import Link from 'next/link';
import type { ReactNode } from 'react';
import { classNames } from './class-names';
import { useTitleBlockSurroundings } from './title-block-context';
import { Wordmark } from './wordmark';

export interface TitleBlockCell {
  label: string;
  value: ReactNode;
  /** Colour of the value: petrol for a state that holds, red for trouble. */
  tone?: 'plain' | 'petrol' | 'red' | 'soft';
  /** A figure is set in the mono face and takes only the room it needs. */
  kind?: 'text' | 'figure';
  /** Makes the cell a link. */
  href?: string;
  /** The cell that names the page; rendered as its heading. */
  heading?: boolean;
  /** Left out on a narrow screen, where the title block has room for about three cells. */
  wideOnly?: boolean;
}

interface TitleBlockProps {
  cells: TitleBlockCell[];
  actions?: ReactNode;
  /** Replaces the cells, for pages that put navigation there. */
  children?: ReactNode;
}

const TONES = { plain: 'text-ink', petrol: 'text-petrol', red: 'text-red', soft: 'text-ink-soft' } as const;

function Cell({ cell }: { cell: TitleBlockCell }) {
  const Value = cell.heading ? 'h1' : 'span';
  const body = (
    <>
      <span className="block truncate text-xs leading-4 text-ink-soft">{cell.label}</span>
      <Value
        className={classNames(
          'block truncate leading-5',
          cell.kind === 'figure' ? 'font-mono text-[0.9375rem] font-medium' : 'text-[0.9875rem] font-semibold',
          TONES[cell.tone ?? 'plain'],
        )}
      >
        {cell.value}
      </Value>
    </>
  );
  const look = classNames(
    'min-w-0 border-l border-rule px-3 py-2 first:border-l-0 lg:first:border-l',
    cell.kind === 'figure' ? 'flex-none lg:min-w-22' : 'flex-1 basis-0',
    cell.wideOnly && 'max-lg:hidden',
  );
  return cell.href ? (
    <Link href={cell.href} className={classNames(look, 'hover:bg-petrol-wash focus-visible:-outline-offset-2')}>
      {body}
    </Link>
  ) : (
    <div className={look}>{body}</div>
  );
}

/**
 * The ruled page header, drawn as the title block of a drawing: the mark, the cells, the actions, the account.
 * On a narrow screen the cells go under the mark as a second row.
 */
export function TitleBlock({ cells, actions, children }: TitleBlockProps) {
  const { homeHref, account } = useTitleBlockSurroundings();
  const hasEnd = Boolean(actions || account);
  return (
    <header className="flex flex-wrap items-stretch border-b-2 border-rule bg-sheet lg:h-[58px] lg:flex-nowrap">
      <div className="flex min-w-0 flex-none items-center px-3.5 py-2 lg:w-[195px] lg:py-0">
        {homeHref ? (
          <Link href={homeHref} aria-label="Elbowroom, all projects" className="flex rounded py-1">
            <Wordmark />
          </Link>
        ) : (
          <Wordmark />
        )}
      </div>
      <div className="order-last flex min-w-0 flex-[1_0_100%] items-stretch border-t border-rule lg:order-none lg:flex-1 lg:border-t-0">
        {children ?? cells.map((cell) => <Cell key={cell.label} cell={cell} />)}
      </div>
      {hasEnd && (
        <div className="flex min-w-0 flex-1 items-center justify-end gap-1.5 px-3 py-2 lg:flex-none lg:border-l lg:border-rule lg:py-0">
          {actions}
          {account}
        </div>
      )}
    </header>
  );
}
