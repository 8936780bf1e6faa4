import type { ReactNode } from 'react';
import { classNames } from './class-names';

/** The ground under the panels of a page, below its title block. */
export function Page({ className, children }: { className?: string; children: ReactNode }) {
  return <main className={classNames('mx-auto w-full max-w-[100rem] p-3 sm:p-5', className)}>{children}</main>;
}
