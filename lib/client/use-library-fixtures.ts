'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import {
  libraryFixtureListSchema,
  libraryFixtureSchema,
  type NewLibraryFixture,
} from '@/lib/contracts/library-fixtures';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

const URL = '/api/fixtures';

/** The fixtures that the organisation keeps, by name. */
export function useLibraryFixtures() {
  return useAnswer(URL, libraryFixtureListSchema);
}

/** Changes to the library; the list is asked for again. All throw ProblemError. */
export function useLibraryFixtureActions() {
  const { mutate } = useSWRConfig();
  return useMemo(
    () => ({
      async save(body: NewLibraryFixture) {
        const saved = await send('POST', URL, body, libraryFixtureSchema);
        await mutate(URL);
        return saved;
      },
      async rename(fixtureId: string, name: string) {
        await send('PATCH', `${URL}/${fixtureId}`, { name }, libraryFixtureSchema);
        await mutate(URL);
      },
      async remove(fixtureId: string) {
        await send('DELETE', `${URL}/${fixtureId}`);
        await mutate(URL);
      },
    }),
    [mutate],
  );
}
