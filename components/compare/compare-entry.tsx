'use client';

import dynamic from 'next/dynamic';
import { LoadingLine } from '@/components/ui/loading-line';

/** The canvas needs a browser, so the comparison is not rendered on the server. */
export const CompareEntry = dynamic(() => import('./compare-page'), {
  ssr: false,
  loading: () => <LoadingLine label="Loading the comparison" />,
});
