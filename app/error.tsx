'use client';

import { useEffect } from 'react';
import { StopPage } from '@/components/shell/stop-page';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';

interface PageErrorProps {
  error: Error & { digest?: string };
  reset: () => void;
}

export default function PageError({ error, reset }: PageErrorProps) {
  useEffect(() => console.error(error), [error]);
  return (
    <StopPage
      title="This page broke"
      actions={
        <>
          <Button variant="action" onClick={reset}>
            Try again
          </Button>
          <LinkButton href="/projects">All projects</LinkButton>
        </>
      }
    >
      <p>What was saved is safe on the server. Try again; if it keeps happening, tell whoever runs this server.</p>
      {error.digest && (
        <p className="mt-2">
          Number for the report: <code>{error.digest}</code>
        </p>
      )}
    </StopPage>
  );
}
