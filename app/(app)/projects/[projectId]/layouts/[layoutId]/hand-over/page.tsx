import type { Metadata } from 'next';
import { LayoutHandOver } from '@/components/reports/hand-over-page';

export const metadata: Metadata = { title: 'Hand over' };

interface HandOverPageProps {
  readonly params: Promise<{ projectId: string; layoutId: string }>;
}

export default async function HandOverPage({ params }: HandOverPageProps) {
  return <LayoutHandOver {...await params} />;
}
