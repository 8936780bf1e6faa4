'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import type { z } from 'zod';
import {
  apiTokenListSchema,
  newApiTokenSchema,
  type apiTokenRequestSchema,
  type NewApiToken,
} from '@/lib/contracts/api-tokens';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

const TOKENS = '/api/tokens';

export function useApiTokens() {
  return useAnswer(TOKENS, apiTokenListSchema);
}

/** Both throw ProblemError. */
export function useApiTokenActions() {
  const { mutate } = useSWRConfig();
  return useMemo(
    () => ({
      async create(request: z.input<typeof apiTokenRequestSchema>): Promise<NewApiToken> {
        const made = await send('POST', TOKENS, request, newApiTokenSchema);
        await mutate(TOKENS);
        return made;
      },
      async revoke(tokenId: string): Promise<void> {
        await send('DELETE', `${TOKENS}/${tokenId}`);
        await mutate(TOKENS);
      },
    }),
    [mutate],
  );
}
