'use client';

import { Copy, Ellipsis, Pencil, Trash2 } from 'lucide-react';
import { useMemo } from 'react';
import { STATE_WORDS } from '@/components/projects/state-words';
import { Button } from '@/components/ui/button';
import { TextLink } from '@/components/ui/link-button';
import { Menu, MenuItem } from '@/components/ui/menu';
import { Moment } from '@/components/ui/moment';
import { Tag } from '@/components/ui/tag';
import { useMayActAs } from '@/lib/client/account-context';
import type { LayoutSummary } from '@/lib/contracts/layouts';
import { VariantPicture } from './variant-picture';
import { SortableTable, type TableColumn } from './sortable-table';

export type VariantDeed = 'rename' | 'copy' | 'delete';

interface VariantsTableProps {
  layouts: readonly LayoutSummary[];
  onDeed: (deed: VariantDeed, layout: LayoutSummary) => void;
}

function VariantMenu({ layout, onDeed }: { layout: LayoutSummary } & Pick<VariantsTableProps, 'onDeed'>) {
  return (
    <Menu
      trigger={
        <Button variant="quiet" size="icon" aria-label={`More for variant ${layout.letter}`}>
          <Ellipsis aria-hidden className="size-4" />
        </Button>
      }
    >
      <MenuItem icon={<Pencil aria-hidden className="size-4" />} onSelect={() => onDeed('rename', layout)}>
        Rename
      </MenuItem>
      <MenuItem icon={<Copy aria-hidden className="size-4" />} onSelect={() => onDeed('copy', layout)}>
        New variant from this one
      </MenuItem>
      <MenuItem
        danger
        disabled={layout.latestRevision !== null}
        icon={<Trash2 aria-hidden className="size-4" />}
        onSelect={() => onDeed('delete', layout)}
      >
        {layout.latestRevision ? 'Issued, so it is kept' : 'Delete'}
      </MenuItem>
    </Menu>
  );
}

/** The variants of a project by letter. */
export function VariantsTable({ layouts, onDeed }: VariantsTableProps) {
  const seesDrafts = useMayActAs('planner');
  const columns = useMemo<TableColumn<LayoutSummary>[]>(
    () => [
      {
        id: 'letter',
        header: 'Letter',
        value: (layout) => layout.letter,
        cell: (layout) => (
          <span className="flex items-center gap-3">
            <span className="text-lg font-semibold">{layout.letter}</span>
            {seesDrafts && <VariantPicture layout={layout} />}
          </span>
        ),
        className: 'w-10',
      },
      {
        id: 'name',
        header: 'Variant',
        value: (layout) => layout.name,
        cell: (layout) => (
          <TextLink href={`/projects/${layout.projectId}/layouts/${layout.id}`} className="font-medium">
            {layout.name}
          </TextLink>
        ),
      },
      {
        id: 'state',
        header: 'State',
        value: (layout) => STATE_WORDS[layout.latestRevision?.state ?? 'draft'].name,
        cell: (layout) => {
          const { name, tone } = STATE_WORDS[layout.latestRevision?.state ?? 'draft'];
          return <Tag tone={tone}>{name}</Tag>;
        },
      },
      {
        id: 'revision',
        header: 'Revision',
        value: (layout) => layout.latestRevision?.number ?? null,
        cell: (layout) =>
          layout.latestRevision ? (
            <TextLink href={`/revisions/${layout.latestRevision.id}`}>{layout.latestRevision.number}</TextLink>
          ) : (
            '–'
          ),
        figures: true,
        wideOnly: true,
      },
      {
        id: 'items',
        header: 'Items',
        value: (layout) => layout.itemCount,
        cell: (layout) => layout.itemCount,
        figures: true,
        wideOnly: true,
      },
      {
        id: 'edited',
        header: 'Edited',
        value: (layout) => layout.updatedAt,
        cell: (layout) => <Moment iso={layout.updatedAt} className="whitespace-nowrap text-ink-soft" />,
        wideOnly: true,
      },
      {
        id: 'more',
        header: 'More',
        headerHidden: true,
        cell: (layout) => <VariantMenu layout={layout} onDeed={onDeed} />,
        className: 'w-10',
      },
    ],
    [onDeed, seesDrafts],
  );
  return (
    <SortableTable
      caption="Variants"
      rows={layouts}
      columns={columns}
      rowId={(layout) => layout.id}
      sortedBy={{ id: 'letter' }}
    />
  );
}
