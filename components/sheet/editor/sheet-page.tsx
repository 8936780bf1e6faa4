'use client';

import dynamic from 'next/dynamic';
import { LoadingLine } from '@/components/ui/loading-line';

/** The canvas needs a browser, so the editor is not rendered on the server. */
export const SheetPage = dynamic(() => import('./sheet-editor'), {
  ssr: false,
  loading: () => <LoadingLine label="Loading the sheet" />,
});
