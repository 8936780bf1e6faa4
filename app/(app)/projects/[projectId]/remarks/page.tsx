import type { Metadata } from 'next';
import { ProjectRemarksPage } from '@/components/projects/project-remarks-page';

export const metadata: Metadata = { title: 'Remarks' };

interface RemarksPageProps {
  readonly params: Promise<{ projectId: string }>;
}

export default async function RemarksPage({ params }: RemarksPageProps) {
  return <ProjectRemarksPage {...await params} />;
}
