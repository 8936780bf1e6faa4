'use client';

import { useEffect } from 'react';
import './globals.css';

interface GlobalErrorProps {
  error: Error & { digest?: string };
  reset: () => void;
}

/** Stands in when the root layout itself breaks, so it leans on nothing but the style sheet. */
export default function GlobalError({ error, reset }: GlobalErrorProps) {
  useEffect(() => console.error(error), [error]);
  return (
    <html lang="en">
      <body>
        <main className="flex min-h-dvh max-w-lg flex-col items-start justify-center gap-4 p-8">
          <h1 className="text-2xl font-semibold">Elbowroom could not start this page</h1>
          <p className="text-ink-soft">
            What was saved is safe on the server. Reload the page, or try again in a moment.
          </p>
          {error.digest && (
            <p>
              Number for the report: <code>{error.digest}</code>
            </p>
          )}
          <button
            type="button"
            onClick={reset}
            className="min-h-11 rounded border border-petrol bg-petrol px-4 font-medium text-on-petrol"
          >
            Try again
          </button>
        </main>
      </body>
    </html>
  );
}
