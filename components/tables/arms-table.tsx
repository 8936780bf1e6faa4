'use client';

import { Figure } from '@/components/ui/figure';
import { TextLink } from '@/components/ui/link-button';
import type { LibraryArm } from '@/lib/contracts/arms';
import { SortableTable, type TableColumn } from './sortable-table';

const COLUMNS: readonly TableColumn<LibraryArm>[] = [
  {
    id: 'name',
    header: 'Arm',
    value: (arm) => arm.name,
    cell: (arm) => (
      <>
        <TextLink href={`/arms/${arm.id}`} className="font-medium">
          {arm.name}
        </TextLink>
        {arm.description && <span className="block max-w-prose text-sm text-ink-soft">{arm.description}</span>}
      </>
    ),
  },
  {
    id: 'reach',
    header: 'Reach',
    value: (arm) => arm.reachMm,
    cell: (arm) => <Figure value={arm.reachMm} unit="mm" />,
    figures: true,
  },
  {
    id: 'payload',
    header: 'Payload',
    value: (arm) => arm.payloadKg,
    cell: (arm) => <Figure value={arm.payloadKg} unit="kg" />,
    figures: true,
    wideOnly: true,
  },
  {
    id: 'joints',
    header: 'Joints',
    value: (arm) => arm.definition.joints.length,
    cell: (arm) => arm.definition.joints.length,
    figures: true,
    wideOnly: true,
  },
  {
    id: 'version',
    header: 'Version',
    value: (arm) => arm.version,
    cell: (arm) => arm.version,
    figures: true,
    wideOnly: true,
  },
  {
    id: 'used',
    header: 'Used in',
    value: (arm) => arm.layoutCount,
    cell: (arm) => (arm.layoutCount === 1 ? '1 layout' : `${arm.layoutCount} layouts`),
    className: 'whitespace-nowrap',
    wideOnly: true,
  },
];

/** The arms of the library by name. */
export function ArmsTable({ arms }: { arms: readonly LibraryArm[] }) {
  return (
    <SortableTable caption="Arms" rows={arms} columns={COLUMNS} rowId={(arm) => arm.id} sortedBy={{ id: 'name' }} />
  );
}
