'use client';

import type { ReactNode } from 'react';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { SectionHeader } from '@/components/shell/section-header';
import { useMayActAs } from '@/lib/client/account-context';

/** Spares others a form that the server would refuse. */
export function ForIntegrators({ children }: { children: ReactNode }) {
  if (useMayActAs('integrator')) return children;
  return (
    <>
      <SectionHeader current="/arms" />
      <Page>
        <Notice title="Only integrators add arms" action={<LinkButton href="/arms">All arms</LinkButton>}>
          Ask an integrator or an admin of your organisation.
        </Notice>
      </Page>
    </>
  );
}
