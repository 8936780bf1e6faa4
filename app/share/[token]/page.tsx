import type { Metadata } from 'next';
import { ShareEntry } from '@/components/share/share-entry';

/** The address is the key: it must not end up in a search engine or in another site's log. */
export const metadata: Metadata = {
  title: 'Drawing for review',
  robots: { index: false, follow: false },
  referrer: 'no-referrer',
};

interface SharedPageProps {
  readonly params: Promise<{ token: string }>;
}

export default async function SharedPage({ params }: SharedPageProps) {
  return <ShareEntry {...await params} />;
}
