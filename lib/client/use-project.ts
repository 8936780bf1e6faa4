'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import type { z } from 'zod';
import {
  layoutListSchema,
  layoutSummarySchema,
  type layoutRequestSchema,
  type LayoutSummary,
} from '@/lib/contracts/layouts';
import { projectSchema } from '@/lib/contracts/projects';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

export function useProject(projectId: string) {
  return useAnswer(`/api/projects/${projectId}`, projectSchema);
}

const layoutsUrl = (projectId: string): string => `/api/projects/${projectId}/layouts`;

/** The variants of a project; a viewer gets only those that were issued. */
export function useLayouts(projectId: string) {
  return useAnswer(layoutsUrl(projectId), layoutListSchema);
}

/** Creating, renaming and deleting variants. Throws ProblemError. */
export function useLayoutActions(projectId: string) {
  const { mutate } = useSWRConfig();
  return useMemo(() => {
    const refresh = () => Promise.all([mutate(layoutsUrl(projectId)), mutate(`/api/projects/${projectId}`)]);
    return {
      async create(request: z.input<typeof layoutRequestSchema>): Promise<LayoutSummary> {
        const layout = await send('POST', layoutsUrl(projectId), request, layoutSummarySchema);
        await refresh();
        return layout;
      },
      async rename(layoutId: string, name: string): Promise<void> {
        await send('PATCH', `/api/layouts/${layoutId}`, { name });
        await refresh();
      },
      async remove(layoutId: string): Promise<void> {
        await send('DELETE', `/api/layouts/${layoutId}`);
        await refresh();
      },
    };
  }, [mutate, projectId]);
}
