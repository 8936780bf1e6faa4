import { headers } from 'next/headers';
import { cache } from 'react';
import { readActor } from '@/lib/server/session';

/** Who is signed in, for server components; null for nobody. Asked once a page. */
export const readMember = cache(async () =>
  // Only the cookie header counts; the address is never looked at.
  readActor(new Request('http://page.invalid/', { headers: await headers() })),
);
