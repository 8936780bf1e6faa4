'use client';

import { useCallback } from 'react';
import type { Guest } from '@/lib/contracts/remarks';
import { signOffStateSchema, type SignOffRequest, type SignOffState } from '@/lib/contracts/sign-offs';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

/** What somebody else signed shows on an open page within this time. */
const REFRESH_MS = 30_000;

export interface SignOffs {
  /** Null while it is read. */
  readonly now: SignOffState | null;
  /** Throws ProblemError. Guests say who they are, members are known. */
  readonly sign: (request: SignOffRequest, guest: Guest | null) => Promise<void>;
}

/** Where a revision stands; `base` is its address, `/api/revisions/…` or `/api/share/…`. */
export function useSignOffs(base: string): SignOffs {
  const url = `${base}/sign-offs`;
  const { data, mutate } = useAnswer(url, signOffStateSchema, { refreshInterval: REFRESH_MS });
  const sign = useCallback(
    async (request: SignOffRequest, guest: Guest | null) => {
      await mutate(await send('POST', url, guest ? { ...request, guest } : request, signOffStateSchema), {
        revalidate: false,
      });
    },
    [url, mutate],
  );
  return { now: data ?? null, sign };
}
