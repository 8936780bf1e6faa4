'use client';

import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { TitleBlock } from '@/components/ui/title-block';
import type { ProblemError } from '@/lib/client/fetcher';

interface SubjectFaultProps {
  error: ProblemError;
  onRetry: () => void;
  /** What could not be shown, as in “This project”. */
  what?: string;
}

/** A page whose subject is not there or cannot be read now. */
export function SubjectFault({ error, onRetry, what = 'This project' }: SubjectFaultProps) {
  const gone = error.status === 404 || error.status === 400 || error.status === 422;
  return (
    <>
      <TitleBlock cells={[{ label: 'Not shown', value: what, heading: true }]} />
      <Page>
        <Notice
          tone="trouble"
          title={gone ? `${what} is not here` : `${what} could not be read`}
          action={
            gone ? <LinkButton href="/projects">All projects</LinkButton> : <Button onClick={onRetry}>Try again</Button>
          }
        >
          {gone ? 'It was removed, or it is not open to you. Check the address, or ask a colleague.' : error.message}
        </Notice>
      </Page>
    </>
  );
}
