'use client';

import { Archive, ArchiveRestore, Ellipsis, Pencil } from 'lucide-react';
import { useMemo } from 'react';
import { Button } from '@/components/ui/button';
import { TextLink } from '@/components/ui/link-button';
import { Menu, MenuItem } from '@/components/ui/menu';
import { Moment } from '@/components/ui/moment';
import type { Project } from '@/lib/contracts/projects';
import { SortableTable, type TableColumn } from './sortable-table';

interface ProjectsTableProps {
  projects: readonly Project[];
  /** Null for those who may not change projects. */
  onRename: ((project: Project) => void) | null;
  onArchive: (project: Project) => void;
}

function ProjectMenu({ project, onRename, onArchive }: ProjectsTableProps & { project: Project }) {
  const archived = project.archivedAt !== null;
  return (
    <Menu
      trigger={
        <Button variant="quiet" size="icon" aria-label={`More for ${project.name}`}>
          <Ellipsis aria-hidden className="size-4" />
        </Button>
      }
    >
      <MenuItem icon={<Pencil aria-hidden className="size-4" />} onSelect={() => onRename?.(project)}>
        Rename
      </MenuItem>
      <MenuItem
        icon={archived ? <ArchiveRestore aria-hidden className="size-4" /> : <Archive aria-hidden className="size-4" />}
        onSelect={() => onArchive(project)}
      >
        {archived ? 'Bring back from the archive' : 'Archive'}
      </MenuItem>
    </Menu>
  );
}

/** The projects, the last edited first. */
export function ProjectsTable(props: ProjectsTableProps) {
  const { projects, onRename, onArchive } = props;
  const columns = useMemo(() => {
    const all: TableColumn<Project>[] = [
      {
        id: 'name',
        header: 'Project',
        value: (project) => project.name,
        cell: (project) => (
          <>
            <TextLink href={`/projects/${project.id}`} className="font-medium">
              {project.name}
            </TextLink>
            <span className="block text-sm text-ink-soft sm:hidden">{project.customerName}</span>
          </>
        ),
      },
      {
        id: 'customer',
        header: 'Customer',
        value: (project) => project.customerName || null,
        cell: (project) => project.customerName || '–',
        wideOnly: true,
      },
      {
        id: 'site',
        header: 'Site',
        value: (project) => project.siteName || null,
        cell: (project) => project.siteName || '–',
        className: 'max-md:hidden',
      },
      {
        id: 'variants',
        header: 'Variants',
        value: (project) => project.layoutCount,
        cell: (project) => project.layoutCount,
        figures: true,
        wideOnly: true,
      },
      {
        id: 'remarks',
        header: 'Open remarks',
        value: (project) => project.openRemarkCount,
        cell: (project) => (
          <span className={project.openRemarkCount > 0 ? 'font-semibold text-amber' : 'text-ink-soft'}>
            {project.openRemarkCount}
          </span>
        ),
        figures: true,
        wideOnly: true,
      },
      {
        id: 'edited',
        header: 'Edited',
        value: (project) => project.updatedAt,
        cell: (project) => <Moment iso={project.updatedAt} className="whitespace-nowrap text-ink-soft" />,
      },
    ];
    if (onRename) {
      all.push({
        id: 'more',
        header: 'More',
        headerHidden: true,
        cell: (project) => <ProjectMenu project={project} projects={[]} onRename={onRename} onArchive={onArchive} />,
        className: 'w-10',
      });
    }
    return all;
  }, [onRename, onArchive]);
  return (
    <SortableTable
      caption="Projects"
      rows={projects}
      columns={columns}
      rowId={(project) => project.id}
      sortedBy={{ id: 'edited', descending: true }}
    />
  );
}
