'use client';

import { useMemo } from 'react';
import { remarkListSchema, remarkSchema, type Guest, type Remark, type RemarkChange } from '@/lib/contracts/remarks';
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
  readonly mentions: readonly string[];
}

export type Said = Pick<NewRemark, 'body' | 'mentions'>;

export interface Review {
  /** Null while they are read. */
  readonly remarks: readonly Remark[] | null;
  readonly error: Error | undefined;
  /** All throw ProblemError; the list is asked for again afterwards. Guests say who they are, members are known. */
  readonly pin: (remark: NewRemark, guest: Guest | null) => Promise<Remark>;
  readonly reply: (remarkId: string, said: Said, guest: Guest | null) => Promise<void>;
  /** Adds a picture to one's own remark. */
  readonly attach: (remarkId: string, file: File) => Promise<void>;
  readonly pictureUrl: (remarkId: string, pictureId: string) => string;
  /** Notes that it has been read; null for guests, whose marks nobody keeps. */
  readonly markRead: ((remarkId: string) => Promise<void>) | null;
  /** Gives it to a planner, until a day; null for those who may not. */
  readonly assign: ((remarkId: string, change: Pick<RemarkChange, 'assigneeId' | 'dueOn'>) => Promise<void>) | null;
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
    // Guests name nobody.
    const withGuest = ({ mentions, ...said }: Said, guest: Guest | null) =>
      guest ? { ...said, guest } : { ...said, mentions };
    const at = (remarkId: string) => (byGuests ? `${url}/${remarkId}` : `/api/remarks/${remarkId}`);
    const change = async (remarkId: string, values: RemarkChange) => {
      await send('PATCH', `/api/remarks/${remarkId}`, values);
      await mutate();
    };
    return {
      async pin(remark: NewRemark, guest: Guest | null) {
        const pinned = await send('POST', url, withGuest(remark, guest), remarkSchema);
        await mutate();
        return pinned;
      },
      async reply(remarkId: string, said: Said, guest: Guest | null) {
        await send('POST', `${at(remarkId)}/replies`, withGuest(said, guest));
        await mutate();
      },
      async attach(remarkId: string, file: File) {
        const form = new FormData();
        form.set('file', file);
        await send('POST', `${at(remarkId)}/pictures`, form);
        await mutate();
      },
      pictureUrl: (remarkId: string, pictureId: string) => `${at(remarkId)}/pictures/${pictureId}`,
      markRead: byGuests
        ? null
        : async (remarkId: string) => {
            await send('POST', `/api/remarks/${remarkId}/read`);
            await mutate();
          },
      assign: maySettle ? change : null,
      settle: maySettle ? (remarkId: string, resolved: boolean) => change(remarkId, { resolved }) : null,
    };
  }, [url, byGuests, maySettle, mutate]);
  return { remarks: data?.remarks ?? null, error, ...actions };
}
