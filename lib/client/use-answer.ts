'use client';

import useSWR, { type SWRConfiguration, type SWRResponse } from 'swr';
import type { z } from 'zod';
import { fetcher, type ProblemError } from './fetcher';

/** SWR over one address, its answer checked against the contract. Null asks nothing. */
export function useAnswer<Schema extends z.ZodType>(
  url: string | null,
  schema: Schema,
  options?: SWRConfiguration<z.infer<Schema>, ProblemError>,
): SWRResponse<z.infer<Schema>, ProblemError> {
  return useSWR<z.infer<Schema>, ProblemError>(url, (asked: string) => fetcher(asked, schema), options);
}
