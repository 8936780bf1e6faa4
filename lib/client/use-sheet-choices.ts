'use client';

import useSWR from 'swr';
import type { LayoutSummary } from '@/lib/contracts/layouts';
import { revisionListSchema, type RevisionSummary } from '@/lib/contracts/revisions';
import { fetcher, type ProblemError } from './fetcher';
import { useLayouts } from './use-project';

export interface VariantChoices {
  readonly layout: LayoutSummary;
  /** Newest first. */
  readonly revisions: readonly RevisionSummary[];
}

/** All that can be laid side by side in a project: every variant's draft and its revisions. */
export function useSheetChoices(projectId: string) {
  const layouts = useLayouts(projectId);
  const issued = layouts.data?.layouts.filter(({ latestRevision }) => latestRevision !== null) ?? [];
  const key = layouts.data && [
    'revisions of',
    ...issued.map(({ id, latestRevision }) => `${id} ${latestRevision?.id}`),
  ];
  const revisions = useSWR<Map<string, RevisionSummary[]>, ProblemError>(key, async () => {
    const lists = await Promise.all(
      issued.map(({ id }) => fetcher(`/api/layouts/${id}/revisions`, revisionListSchema)),
    );
    return new Map(issued.map(({ id }, index) => [id, lists[index].revisions]));
  });
  const choices: readonly VariantChoices[] | null =
    layouts.data && revisions.data
      ? layouts.data.layouts.map((layout) => ({ layout, revisions: revisions.data?.get(layout.id) ?? [] }))
      : null;
  return {
    choices,
    error: layouts.error ?? revisions.error,
    tryAgain: () => void Promise.all([layouts.mutate(), revisions.mutate()]),
  };
}
