import type { Metadata } from 'next';
import { ProjectPage } from '@/components/projects/project-page';

export const metadata: Metadata = { title: 'Project' };

export default async function Page({ params }: { params: Promise<{ projectId: string }> }) {
  const { projectId } = await params;
  return <ProjectPage projectId={projectId} />;
}
