'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import {
  comparisonListSchema,
  comparisonSchema,
  type Comparison,
  type ComparisonRequest,
} from '@/lib/contracts/comparisons';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

const listUrl = (projectId: string): string => `/api/projects/${encodeURIComponent(projectId)}/comparisons`;

/** The comparisons that were kept in a project, newest first. */
export function useComparisons(projectId: string) {
  return useAnswer(listUrl(projectId), comparisonListSchema);
}

/** Keeping one and taking one away. Throws ProblemError. */
export function useComparisonActions(projectId: string) {
  const { mutate } = useSWRConfig();
  return useMemo(
    () => ({
      async keep(request: ComparisonRequest): Promise<Comparison> {
        const kept = await send('POST', listUrl(projectId), request, comparisonSchema);
        await mutate(listUrl(projectId));
        return kept;
      },
      async drop(comparisonId: string): Promise<void> {
        await send('DELETE', `/api/comparisons/${comparisonId}`);
        await mutate(listUrl(projectId));
      },
    }),
    [mutate, projectId],
  );
}

const SIDES = ['left', 'right', 'third', 'fourth'];

/** Where a comparison is looked at. */
export function comparisonPath(projectId: string, { sheets, view }: Pick<Comparison, 'sheets' | 'view'>): string {
  const query = new URLSearchParams(sheets.map((ref, index) => [SIDES[index], ref]));
  query.set('measure', view.measure);
  query.set('wrist', view.wrist);
  return `/projects/${projectId}/compare?${query}`;
}
