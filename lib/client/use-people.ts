'use client';

import { peopleSchema } from '@/lib/contracts/remarks';
import { useAnswer } from './use-answer';

/** Members who can see the project, and so be named in a remark. */
export function usePeople(projectId: string) {
  return useAnswer(`/api/projects/${encodeURIComponent(projectId)}/people`, peopleSchema, { revalidateOnFocus: false });
}
