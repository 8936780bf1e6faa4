'use client';

import { useMemo } from 'react';
import { remarkListSchema, type Guest, type Remark } from '@/lib/contracts/remarks';
import { revisionSchema } from '@/lib/contracts/revisions';
import { sharedRevisionSchema } from '@/lib/contracts/share-links';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

/** A remark of the other side shows on an open page within this time. */
const REFRESH_MS = 15_000;

export interface NewRemark {
  readonly xMm: number;
  readonly yMm: number;
  readonly itemId: string | null;
  readonly body: string;
}

export interface Review {
  /** Null while they are read. */
  readonly remarks: readonly Remark[] | null;
  readonly error: Error | undefined;
  /** All throw ProblemError; the list is asked for again afterwards. Guests say who they are, members are known. */
  readonly pin: (remark: NewRemark, guest: Guest | null) => Promise<void>;
  readonly reply: (remarkId: string, body: string, guest: Guest | null) => Promise<void>;
  /** Null for those who may not settle remarks. */
  readonly settle: ((remarkId: string, resolved: boolean) => Promise<void>) | null;
}

/** A revision never changes, and each reading of a link is counted, so it is read once. */
const ONCE = { revalidateOnFocus: false, revalidateOnReconnect: false, revalidateIfStale: false };

/** The revision behind a share link. */
export function useSharedRevision(token: string) {
  return useAnswer(`/api/share/${encodeURIComponent(token)}`, sharedRevisionSchema, {
    ...ONCE,
    shouldRetryOnError: false,
  });
}

export function useRevision(revisionId: string) {
  return useAnswer(`/api/revisions/${encodeURIComponent(revisionId)}`, revisionSchema, ONCE);
}

/** Remarks behind a share link: read, pinned and answered by guests. */
export function useSharedReview(token: string): Review {
  return useRemarksAt({ url: `/api/share/${encodeURIComponent(token)}/remarks`, byGuests: true, maySettle: false });
}

/** Remarks on a revision, for signed-in people. */
export function useRevisionReview(revisionId: string, maySettle: boolean): Review {
  return useRemarksAt({ url: `/api/revisions/${encodeURIComponent(revisionId)}/remarks`, byGuests: false, maySettle });
}

interface RemarkList {
  readonly url: string;
  /** Guests answer under the list's own address, members at /api/remarks. */
  readonly byGuests: boolean;
  readonly maySettle: boolean;
}

function useRemarksAt({ url, byGuests, maySettle }: RemarkList): Review {
  const { data, error, mutate } = useAnswer(url, remarkListSchema, { refreshInterval: REFRESH_MS });
  const actions = useMemo(() => {
    const withGuest = (body: object, guest: Guest | null) => (guest ? { ...body, guest } : body);
    return {
      async pin(remark: NewRemark, guest: Guest | null) {
        await send('POST', url, withGuest(remark, guest));
        await mutate();
      },
      async reply(remarkId: string, body: string, guest: Guest | null) {
        const where = byGuests ? `${url}/${remarkId}/replies` : `/api/remarks/${remarkId}/replies`;
        await send('POST', where, withGuest({ body }, guest));
        await mutate();
      },
      settle: maySettle
        ? async (remarkId: string, resolved: boolean) => {
            await send('PATCH', `/api/remarks/${remarkId}`, { resolved });
            await mutate();
          }
        : null,
    };
  }, [url, byGuests, maySettle, mutate]);
  return { remarks: data?.remarks ?? null, error, ...actions };
}
