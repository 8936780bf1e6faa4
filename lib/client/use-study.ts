'use client';

import { useCallback, useState } from 'react';
import useSWR from 'swr';
import { studySchema, type Study, type StudyQuestion } from '@/lib/contracts/studies';
import { fetcher, sayError, send, type ProblemError } from './fetcher';

const address = (studyId: string) => `/api/studies/${encodeURIComponent(studyId)}`;

/** How often a study under way is looked at, ms. */
const LOOK_MS = 800;

export const isUnderWay = ({ state }: Study): boolean => state === 'queued' || state === 'running';

export function askStudy(question: StudyQuestion): Promise<Study> {
  return send('POST', '/api/studies', question, studySchema);
}

export interface FollowedStudy {
  readonly study: Study | null;
  /** Why it cannot be seen, in words. */
  readonly trouble: string | null;
  readonly cancel: () => Promise<void>;
  readonly retry: () => Promise<void>;
}

/** Follows a study until it has ended; several who follow the same one ask once. */
export function useStudy(studyId: string | null): FollowedStudy {
  const { data, error, mutate } = useSWR<Study, ProblemError>(
    studyId && address(studyId),
    (url: string) => fetcher(url, studySchema),
    { refreshInterval: (latest) => (latest && !isUnderWay(latest) ? 0 : LOOK_MS), revalidateOnFocus: false },
  );
  const [refusal, setRefusal] = useState<string | null>(null);
  const command = useCallback(
    async (what: 'cancel' | 'retry') => {
      if (!studyId) return;
      setRefusal(null);
      try {
        const next = await send('POST', `${address(studyId)}/${what}`, undefined, studySchema);
        await mutate(next, { revalidate: false });
      } catch (problem) {
        setRefusal(sayError(problem));
      }
    },
    [studyId, mutate],
  );
  return {
    study: data ?? null,
    trouble: refusal ?? (error ? sayError(error) : null),
    cancel: useCallback(() => command('cancel'), [command]),
    retry: useCallback(() => command('retry'), [command]),
  };
}
