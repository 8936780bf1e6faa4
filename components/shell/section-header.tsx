'use client';

import Link from 'next/link';
import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';
import { TitleBlock } from '@/components/ui/title-block';
import { useAccount } from '@/lib/client/account-context';
import { sectionsFor } from './sections';

/** The title block of the pages that list things: the organisation, then the sections as its cells. */
export function SectionHeader({ current, actions }: { current: string; actions?: ReactNode }) {
  const account = useAccount();
  return (
    <TitleBlock cells={[]} actions={actions}>
      <div className="hidden min-w-0 flex-1 border-l border-rule px-3 py-2 lg:block">
        <span className="block text-xs leading-4 text-ink-soft">Organisation</span>
        <span className="block truncate leading-5 font-semibold">{account.organisation.name}</span>
      </div>
      <nav aria-label="Sections" className="flex flex-1 lg:flex-none">
        {sectionsFor(account.role).map((section) => {
          const isCurrent = section.href === current;
          return (
            <Link
              key={section.href}
              href={section.href}
              aria-current={isCurrent ? 'page' : undefined}
              className={classNames(
                'flex min-h-11 flex-1 items-center justify-center border-l border-rule px-6 font-medium first:border-l-0 focus-visible:-outline-offset-2 lg:first:border-l',
                isCurrent ? 'bg-ink text-sheet' : 'hover:bg-petrol-wash',
              )}
            >
              {section.name}
            </Link>
          );
        })}
      </nav>
    </TitleBlock>
  );
}
