'use client';

import { useCallback } from 'react';
import { remarkListSchema, type Remark } from '@/lib/contracts/remarks';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

/** A remark of the customer shows on an open sheet within this time. */
const REFRESH_MS = 10_000;

export interface LayoutRemarks {
  readonly remarks: readonly Remark[] | null;
  readonly error: Error | undefined;
  /** Both throw ProblemError; the list is asked for again afterwards. */
  answer(remarkId: string, body: string): Promise<void>;
  resolve(remarkId: string, resolved: boolean): Promise<void>;
}

/** The remarks on all revisions of a layout. */
export function useLayoutRemarks(layoutId: string): LayoutRemarks {
  const { data, error, mutate } = useAnswer(`/api/layouts/${encodeURIComponent(layoutId)}/remarks`, remarkListSchema, {
    refreshInterval: REFRESH_MS,
  });
  const answer = useCallback(
    async (remarkId: string, body: string) => {
      await send('POST', `/api/remarks/${encodeURIComponent(remarkId)}/replies`, { body });
      await mutate();
    },
    [mutate],
  );
  const resolve = useCallback(
    async (remarkId: string, resolved: boolean) => {
      await send('PATCH', `/api/remarks/${encodeURIComponent(remarkId)}`, { resolved });
      await mutate();
    },
    [mutate],
  );
  return { remarks: data?.remarks ?? null, error, answer, resolve };
}
