'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import type { SignOffs } from '@/lib/client/use-sign-offs';
import type { SignOffDecision } from '@/lib/contracts/sign-offs';
import { SignOffDialog } from './sign-off-dialog';

export interface SignOffBarProps {
  readonly signOffs: SignOffs;
  /** Of what is on the screen. */
  readonly sha256: string;
  readonly number: number;
  readonly asGuest: boolean;
}

/** The two words that a reviewer can say; stays in reach under the drawing on a phone. */
export function SignOffBar({ signOffs, sha256, number, asGuest }: SignOffBarProps) {
  const [asked, setAsked] = useState<SignOffDecision | null>(null);
  const state = signOffs.now?.state;
  if (!state) return null;
  if (state === 'superseded') {
    return (
      <p className="sticky bottom-0 z-10 border-t border-rule bg-sheet px-3.5 py-2.5 text-ink-soft">
        A newer revision has replaced this one. It can be read, and no longer be signed.
      </p>
    );
  }
  return (
    <div className="sticky bottom-0 z-10 border-t-2 border-ink bg-sheet px-3 py-2.5">
      <div className="grid grid-cols-2 gap-2.5">
        <Button className="min-h-12" onClick={() => setAsked('changes_requested')}>
          Ask for changes
        </Button>
        <Button
          className="min-h-12"
          variant="action"
          disabled={state === 'accepted'}
          onClick={() => setAsked('accepted')}
        >
          {state === 'accepted' ? 'Accepted' : 'Accept revision'}
        </Button>
      </div>
      {asked && (
        <SignOffDialog
          decision={asked}
          number={number}
          sha256={sha256}
          asGuest={asGuest}
          sign={signOffs.sign}
          onClose={() => setAsked(null)}
        />
      )}
    </div>
  );
}
