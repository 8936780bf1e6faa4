'use client';

import { useEffect } from 'react';
import { LoadingLine } from '@/components/ui/loading-line';

/** Takes a reader without a session to sign-in; the present address goes along and is come back to. */
export function LeaveForSignIn() {
  useEffect(() => {
    const here = window.location.pathname + window.location.search;
    window.location.replace(`/sign-in?return=${encodeURIComponent(here)}`);
  }, []);
  return (
    <>
      <LoadingLine label="Going to sign-in" />
      <noscript>
        <p className="p-4">
          <a href="/sign-in">Sign in</a> to see this page.
        </p>
      </noscript>
    </>
  );
}
