'use client';

import { Plus, Search } from 'lucide-react';
import { useRouter } from 'next/navigation';
import { useCallback, useState } from 'react';
import { ProjectDialog } from '@/components/forms/project-dialog';
import { ProjectsTable } from '@/components/tables/projects-table';
import { Button } from '@/components/ui/button';
import { EmptyState } from '@/components/ui/empty-state';
import { LoadingLine } from '@/components/ui/loading-line';
import { Notice } from '@/components/ui/notice';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { TextInput } from '@/components/ui/text-input';
import { toast } from '@/components/ui/toaster';
import { useMayActAs } from '@/lib/client/account-context';
import { sayError } from '@/lib/client/fetcher';
import { useProjectActions, useProjects } from '@/lib/client/use-projects';
import { useSettled } from '@/lib/client/use-settled';
import type { Project } from '@/lib/contracts/projects';
import { SectionHeader } from '@/components/shell/section-header';

type Shelf = 'current' | 'archived';

/** All projects of the organisation: find one, open it, make a new one, put one away. */
export function ProjectsPage() {
  const router = useRouter();
  const mayPlan = useMayActAs('planner');
  const [search, setSearch] = useState('');
  const [shelf, setShelf] = useState<Shelf>('current');
  const [creating, setCreating] = useState(false);
  const [renaming, setRenaming] = useState<Project | null>(null);
  const actions = useProjectActions();
  const asked = useSettled(search.trim());
  const { data, error, isLoading, mutate } = useProjects({ archived: shelf === 'archived', search: asked });

  const archive = useCallback(
    async (project: Project) => {
      const archived = project.archivedAt === null;
      try {
        await actions.change(project.id, { archived });
        toast.success(archived ? `${project.name} is archived` : `${project.name} is back`);
      } catch (fault) {
        toast.error(sayError(fault));
      }
    },
    [actions],
  );

  const projects = data?.projects ?? [];
  return (
    <>
      <SectionHeader
        current="/projects"
        actions={
          mayPlan && (
            <Button variant="action" onClick={() => setCreating(true)}>
              <Plus aria-hidden className="size-4" />
              New project
            </Button>
          )
        }
      />
      <Page>
        <Panel
          title="Projects"
          level={1}
          aside={
            <div className="flex flex-wrap items-center gap-2">
              <span className="relative">
                <Search aria-hidden className="pointer-events-none absolute top-1/2 left-2 size-4 -translate-y-1/2" />
                <TextInput
                  type="search"
                  aria-label="Search projects"
                  placeholder="Name, customer, site"
                  value={search}
                  onChange={(event) => setSearch(event.target.value)}
                  className="w-56 pl-8 max-sm:w-48"
                />
              </span>
              <SegmentedControl
                label="Which projects"
                value={shelf}
                onValueChange={setShelf}
                options={[
                  { value: 'current', label: 'Current' },
                  { value: 'archived', label: 'Archived' },
                ]}
              />
            </div>
          }
        >
          {isLoading && <LoadingLine label="Loading the projects" />}
          {error && !data && (
            <Notice tone="trouble" className="m-3.5" action={<Button onClick={() => void mutate()}>Try again</Button>}>
              {error.message}
            </Notice>
          )}
          {projects.length > 0 && (
            <ProjectsTable projects={projects} onRename={mayPlan ? setRenaming : null} onArchive={archive} />
          )}
          {data && projects.length === 0 && (
            <NoProjects
              search={asked}
              shelf={shelf}
              mayPlan={mayPlan}
              onCreate={() => setCreating(true)}
              onClear={() => setSearch('')}
            />
          )}
        </Panel>
      </Page>
      <ProjectDialog
        open={creating}
        onOpenChange={setCreating}
        title="New project"
        submitLabel="Create project"
        onSubmit={async (request) => {
          const project = await actions.create(request);
          router.push(`/projects/${project.id}`);
        }}
      />
      <ProjectDialog
        open={renaming !== null}
        onOpenChange={(open) => !open && setRenaming(null)}
        title="Rename project"
        submitLabel="Save"
        start={renaming ?? undefined}
        onSubmit={async (request) => {
          if (renaming) await actions.change(renaming.id, request);
          setRenaming(null);
        }}
      />
    </>
  );
}

interface NoProjectsProps {
  search: string;
  shelf: Shelf;
  mayPlan: boolean;
  onCreate: () => void;
  onClear: () => void;
}

function NoProjects({ search, shelf, mayPlan, onCreate, onClear }: NoProjectsProps) {
  if (search) {
    return (
      <EmptyState
        title={`No project matches “${search}”`}
        body={`The search looks into name, customer and site of ${shelf} projects.`}
        action={<Button onClick={onClear}>Clear the search</Button>}
      />
    );
  }
  if (shelf === 'archived') {
    return (
      <EmptyState
        title="Nothing is archived"
        body="A project whose work is over can be put away here and brought back at any time."
      />
    );
  }
  if (!mayPlan) {
    return (
      <EmptyState
        title="No project is open to you yet"
        body="Ask the person who invited you to name the projects you may look at."
      />
    );
  }
  return (
    <EmptyState
      title="No projects yet"
      body="Start with one: give it a name, then upload the floor plan and set it to scale."
      action={
        <Button variant="action" onClick={onCreate}>
          <Plus aria-hidden className="size-4" />
          Create the first project
        </Button>
      }
    />
  );
}
