import type { Project as ProjectAnswer } from '@/lib/contracts/projects';
import type { CountedProject } from './data';

export function presentProject(project: CountedProject): ProjectAnswer {
  // Figures that are no columns are read through get().
  const figure = <T>(name: string): T => project.get(name as keyof CountedProject) as T;
  return {
    id: project.id,
    name: project.name,
    customerName: project.customerName,
    siteName: project.siteName,
    archivedAt: project.archivedAt?.toISOString() ?? null,
    createdAt: project.createdAt.toISOString(),
    updatedAt: figure<Date>('changedAt').toISOString(),
    layoutCount: figure<number>('layoutCount'),
    openRemarkCount: figure<number>('openRemarkCount'),
  };
}
