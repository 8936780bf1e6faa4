'use client';

import { revisionListSchema } from '@/lib/contracts/revisions';
import { useAnswer } from './use-answer';

/** The issued revisions of a variant, newest first. */
export function useRevisions(layoutId: string, options: { refreshInterval?: number } = {}) {
  return useAnswer(`/api/layouts/${layoutId}/revisions`, revisionListSchema, options);
}
