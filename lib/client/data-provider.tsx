'use client';

import type { ReactNode } from 'react';
import { SWRConfig } from 'swr';
import { ProblemError } from './fetcher';

/** A session that ended while the page was open: back to sign-in, and afterwards back here. */
function leaveForSignIn(): void {
  const here = window.location.pathname + window.location.search;
  window.location.replace(`/sign-in?return=${encodeURIComponent(here)}`);
}

/** What all data on a page shares: no retry of what was refused, and the way to sign-in when the session is over. */
export function DataProvider({ children }: { children: ReactNode }) {
  return (
    <SWRConfig
      value={{
        shouldRetryOnError: (error) => !(error instanceof ProblemError) || error.status === 0 || error.status >= 500,
        errorRetryCount: 4,
        onError: (error) => {
          if (error instanceof ProblemError && error.status === 401) leaveForSignIn();
        },
      }}
    >
      {children}
    </SWRConfig>
  );
}
