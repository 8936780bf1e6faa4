'use client';

import {
  createColumnHelper,
  createSortedRowModel,
  rowSortingFeature,
  tableFeatures,
  useTable,
  type RowData,
} from '@tanstack/react-table';
import { useMemo, type ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';
import { DataCell, DataRow, DataTable, HeadCell, SortHeadCell } from '@/components/ui/data-table';
import { VisuallyHidden } from '@/components/ui/visually-hidden';

export interface TableColumn<Row> {
  id: string;
  header: string;
  /** What the column sorts by; without it the column does not sort. */
  value?: (row: Row) => string | number | null;
  cell: (row: Row) => ReactNode;
  figures?: boolean;
  /** The head is read aloud, not drawn: for a column of buttons. */
  headerHidden?: boolean;
  /** Left out below 640 px. */
  wideOnly?: boolean;
  className?: string;
}

interface SortableTableProps<Row> {
  caption: string;
  /** Keep both the same between renders, or the table sorts anew each time. */
  rows: readonly Row[];
  columns: readonly TableColumn<Row>[];
  rowId: (row: Row) => string;
  sortedBy?: { id: string; descending?: boolean };
}

const features = tableFeatures({ rowSortingFeature, sortedRowModel: createSortedRowModel() });

const collator = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

function compare(first: unknown, second: unknown): number {
  if (typeof first === 'number' && typeof second === 'number') return first - second;
  return collator.compare(String(first), String(second));
}

/** A ruled table whose heads sort it; empty values stay at the end either way. */
export function SortableTable<Row extends RowData>({
  caption,
  rows,
  columns,
  rowId,
  sortedBy,
}: SortableTableProps<Row>) {
  const definitions = useMemo(() => {
    const helper = createColumnHelper<typeof features, Row>();
    return helper.columns(
      columns.map((column) =>
        helper.accessor((row) => column.value?.(row) ?? undefined, {
          id: column.id,
          enableSorting: column.value !== undefined,
          sortUndefined: 'last',
          sortFn: (a, b, id) => compare(a.getValue(id), b.getValue(id)),
          header: column.header,
        }),
      ),
    );
  }, [columns]);
  const table = useTable({
    features,
    columns: definitions,
    data: rows,
    getRowId: rowId,
    enableSortingRemoval: false,
    enableMultiSort: false,
    initialState: { sorting: sortedBy ? [{ id: sortedBy.id, desc: sortedBy.descending ?? false }] : [] },
  });
  const byId = useMemo(() => new Map(columns.map((column) => [column.id, column])), [columns]);
  const lookOf = (column: TableColumn<Row>): string => classNames(column.wideOnly && 'max-sm:hidden', column.className);

  return (
    <DataTable caption={caption}>
      <thead>
        {table.getHeaderGroups().map((group) => (
          <tr key={group.id}>
            {group.headers.map((header) => {
              const column = byId.get(header.column.id);
              if (!column) return null;
              if (!header.column.getCanSort()) {
                return (
                  <HeadCell key={header.id} figures={column.figures} className={lookOf(column)}>
                    {column.headerHidden ? <VisuallyHidden>{column.header}</VisuallyHidden> : column.header}
                  </HeadCell>
                );
              }
              return (
                <SortHeadCell
                  key={header.id}
                  figures={column.figures}
                  className={lookOf(column)}
                  direction={header.column.getIsSorted()}
                  onSort={() => header.column.toggleSorting()}
                >
                  {column.header}
                </SortHeadCell>
              );
            })}
          </tr>
        ))}
      </thead>
      <tbody>
        {table.getRowModel().rows.map((row) => (
          <DataRow key={row.id} className="hover:bg-petrol-wash/50">
            {columns.map((column) => (
              <DataCell key={column.id} figures={column.figures} className={lookOf(column)}>
                {column.cell(row.original)}
              </DataCell>
            ))}
          </DataRow>
        ))}
      </tbody>
    </DataTable>
  );
}
