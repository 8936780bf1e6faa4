'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import {
  libraryArmListSchema,
  libraryArmSchema,
  type ArmContent,
  type LibraryArm,
  type NewArmVersion,
} from '@/lib/contracts/arms';
import { send } from './fetcher';
import { ProblemError } from './problem-error';
import { useAnswer } from './use-answer';

/** Every version of every arm that is offered for placing, or of those that were put away. */
export function useArms({ archived = false }: { archived?: boolean } = {}) {
  return useAnswer(archived ? '/api/arms?archived=true' : '/api/arms', libraryArmListSchema);
}

export function useArm(armId: string) {
  return useAnswer(`/api/arms/${armId}`, libraryArmSchema);
}

/** All versions of the arm that this is a version of, newest first. */
export function useArmVersions(armId: string) {
  return useAnswer(`/api/arms/${armId}/versions`, libraryArmListSchema);
}

const isArmUrl = (key: unknown): boolean => typeof key === 'string' && key.startsWith('/api/arms');

/** Changes to the library; every list of arms on the page is asked for again. All throw ProblemError. */
export function useArmActions() {
  const { mutate } = useSWRConfig();
  return useMemo(() => {
    const change = async (method: 'POST' | 'PATCH', url: string, body: object): Promise<LibraryArm> => {
      const arm = await send(method, url, body, libraryArmSchema);
      await mutate(isArmUrl);
      return arm;
    };
    return {
      create: (content: ArmContent) => change('POST', '/api/arms', content),
      copy: (copyOf: string, name: string) => change('POST', '/api/arms', { copyOf, name }),
      saveVersion: (armId: string, body: NewArmVersion) => change('POST', `/api/arms/${armId}/versions`, body),
      setArchived: (armId: string, archived: boolean) => change('PATCH', `/api/arms/${armId}`, { archived }),
    };
  }, [mutate]);
}

/** The version that somebody else saved meanwhile, if that is why a save was refused. */
export function newerVersionOf(error: unknown): LibraryArm | null {
  if (!(error instanceof ProblemError) || error.code !== 'stale_arm') return null;
  const parsed = libraryArmSchema.safeParse((error.problem as { newest?: unknown }).newest);
  return parsed.success ? parsed.data : null;
}
