'use client';

import { remarkListSchema } from '@/lib/contracts/remarks';
import { useAnswer } from './use-answer';

/** The remarks on every revision of a variant. */
export function useLayoutRemarks(layoutId: string | null) {
  return useAnswer(layoutId && `/api/layouts/${layoutId}/remarks`, remarkListSchema);
}
