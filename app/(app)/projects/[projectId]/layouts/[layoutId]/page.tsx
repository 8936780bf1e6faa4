import type { Metadata } from 'next';
import { SheetPage } from '@/components/sheet/editor/sheet-page';

export const metadata: Metadata = { title: 'Sheet' };

interface LayoutPageProps {
  readonly params: Promise<{ projectId: string; layoutId: string }>;
}

export default async function LayoutPage({ params }: LayoutPageProps) {
  return <SheetPage {...await params} />;
}
