'use client';

import dynamic from 'next/dynamic';
import { LoadingLine } from '@/components/ui/loading-line';

/** The canvas needs a browser, so what is behind a link is not rendered on the server. */
export const ShareEntry = dynamic(() => import('./share-page'), {
  ssr: false,
  loading: () => <LoadingLine label="Opening the drawing" />,
});
