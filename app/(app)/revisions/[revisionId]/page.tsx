import type { Metadata } from 'next';
import { RevisionEntry } from '@/components/share/revision-entry';

export const metadata: Metadata = { title: 'Revision' };

interface RevisionPageProps {
  readonly params: Promise<{ revisionId: string }>;
}

export default async function RevisionPage({ params }: RevisionPageProps) {
  return <RevisionEntry {...await params} />;
}
