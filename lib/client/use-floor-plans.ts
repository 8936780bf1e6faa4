'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import {
  floorPlanListSchema,
  floorPlanSchema,
  type FloorPlan,
  type FloorPlanChange,
} from '@/lib/contracts/floor-plans';
import { send } from './fetcher';
import { upload } from './upload';
import { useAnswer } from './use-answer';

const listUrl = (projectId: string): string => `/api/projects/${projectId}/floor-plans`;
const planUrl = (floorPlanId: string): string => `/api/floor-plans/${floorPlanId}`;

export function useFloorPlans(projectId: string | null) {
  return useAnswer(projectId && listUrl(projectId), floorPlanListSchema);
}

export function useFloorPlan(floorPlanId: string) {
  return useAnswer(planUrl(floorPlanId), floorPlanSchema, { revalidateOnFocus: false });
}

/** Address of a floor plan's picture, in the smallest stored size at least `widthPx` wide. */
export const pictureUrl = (floorPlanId: string, widthPx: number): string =>
  `${planUrl(floorPlanId)}/picture?width=${Math.ceil(widthPx)}`;

/** Uploading, renaming, setting to scale, deleting. Throws ProblemError. */
export function useFloorPlanActions(projectId: string) {
  const { mutate } = useSWRConfig();
  return useMemo(() => {
    const refresh = () => mutate(listUrl(projectId));
    return {
      async add(file: File, onProgress: (share: number) => void, signal: AbortSignal): Promise<FloorPlan> {
        const form = new FormData();
        form.append('file', file, file.name);
        const floorPlan = await upload(listUrl(projectId), form, { schema: floorPlanSchema, onProgress, signal });
        await refresh();
        return floorPlan;
      },
      async change(floorPlanId: string, change: FloorPlanChange): Promise<FloorPlan> {
        const floorPlan = await send('PATCH', planUrl(floorPlanId), change, floorPlanSchema);
        await Promise.all([mutate(planUrl(floorPlanId), floorPlan, { revalidate: false }), refresh()]);
        return floorPlan;
      },
      async remove(floorPlanId: string): Promise<void> {
        await send('DELETE', planUrl(floorPlanId));
        await refresh();
      },
    };
  }, [mutate, projectId]);
}
