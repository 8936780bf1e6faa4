'use client';

import { useMemo } from 'react';
import { useSWRConfig } from 'swr';
import {
  projectListSchema,
  projectSchema,
  type Project,
  type ProjectChange,
  type ProjectRequest,
} from '@/lib/contracts/projects';
import { send } from './fetcher';
import { useAnswer } from './use-answer';

interface ProjectsAsked {
  archived?: boolean;
  search?: string;
}

/** The projects the reader may see; the previous list stays while another search is under way. */
export function useProjects({ archived = false, search = '' }: ProjectsAsked = {}) {
  const query = new URLSearchParams({ archived: String(archived), search });
  return useAnswer(`/api/projects?${query}`, projectListSchema, { keepPreviousData: true });
}

const isProjectUrl = (key: unknown): boolean => typeof key === 'string' && key.startsWith('/api/projects');

/** Creating, renaming, archiving. Every list of projects on the page is asked for again. Throws ProblemError. */
export function useProjectActions() {
  const { mutate } = useSWRConfig();
  return useMemo(
    () => ({
      async create(request: ProjectRequest): Promise<Project> {
        const project = await send('POST', '/api/projects', request, projectSchema);
        await mutate(isProjectUrl);
        return project;
      },
      async change(projectId: string, change: ProjectChange): Promise<Project> {
        const project = await send('PATCH', `/api/projects/${projectId}`, change, projectSchema);
        await mutate(isProjectUrl);
        return project;
      },
    }),
    [mutate],
  );
}
