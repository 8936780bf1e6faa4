import type { Metadata } from 'next';
import { RevisionHandOver } from '@/components/reports/hand-over-page';

export const metadata: Metadata = { title: 'Hand over' };

interface HandOverPageProps {
  readonly params: Promise<{ revisionId: string }>;
}

export default async function HandOverPage({ params }: HandOverPageProps) {
  return <RevisionHandOver {...await params} />;
}
