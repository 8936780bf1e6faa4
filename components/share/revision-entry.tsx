'use client';

import dynamic from 'next/dynamic';
import { LoadingLine } from '@/components/ui/loading-line';

/** The canvas needs a browser, so a revision is not rendered on the server. */
export const RevisionEntry = dynamic(() => import('./revision-page'), {
  ssr: false,
  loading: () => <LoadingLine label="Opening the revision" />,
});
