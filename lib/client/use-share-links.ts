'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import type { z } from 'zod';
import { newShareLinkSchema, shareLinkListSchema, type shareLinkRequestSchema } from '@/lib/contracts/share-links';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

const listUrl = (revisionId: string): string => `/api/revisions/${revisionId}/share-links`;

/** The share links of a revision; null asks nothing. */
export function useShareLinks(revisionId: string | null) {
  return useAnswer(revisionId && listUrl(revisionId), shareLinkListSchema);
}

/** Making and revoking links. Only the answer to `create` bears the address. Throws ProblemError. */
export function useShareLinkActions(revisionId: string) {
  const { mutate } = useSWRConfig();
  return useMemo(
    () => ({
      async create(request: z.input<typeof shareLinkRequestSchema>): Promise<z.infer<typeof newShareLinkSchema>> {
        const link = await send('POST', listUrl(revisionId), request, newShareLinkSchema);
        await mutate(listUrl(revisionId));
        return link;
      },
      async revoke(shareLinkId: string): Promise<void> {
        await send('DELETE', `/api/share-links/${shareLinkId}`);
        await mutate(listUrl(revisionId));
      },
    }),
    [mutate, revisionId],
  );
}
