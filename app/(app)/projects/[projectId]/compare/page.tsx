import type { Metadata } from 'next';
import { CompareEntry } from '@/components/compare/compare-entry';

export const metadata: Metadata = { title: 'Compare' };

interface ComparePageProps {
  readonly params: Promise<{ projectId: string }>;
}

export default async function ComparePage({ params }: ComparePageProps) {
  return <CompareEntry {...await params} />;
}
