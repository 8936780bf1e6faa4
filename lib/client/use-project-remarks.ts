'use client';

import { remarkListSchema } from '@/lib/contracts/remarks';
import { useAnswer } from './use-answer';

/** A remark of the customer shows on an open table within this time. */
const REFRESH_MS = 15_000;

/** The remarks on every variant of a project. */
export function useProjectRemarks(projectId: string) {
  return useAnswer(`/api/projects/${encodeURIComponent(projectId)}/remarks`, remarkListSchema, {
    refreshInterval: REFRESH_MS,
  });
}
