'use client';

import { ArrowDown, ArrowUp, Ellipsis, Trash2 } from 'lucide-react';
import { memo } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { Menu, MenuItem } from '@/components/ui/menu';
import { GRID_FIELDS } from '@/lib/editor/arm/grid';
import type { DraftJoint } from '@/lib/editor/arm/draft';
import { JOINT_COLUMNS, KIND_WORDS } from '@/lib/layout/arm-columns';
import { CELL_LOOK, DraftCellInput } from './draft-cell-input';

export type JointMove = 'up' | 'down' | 'remove';

interface DraftJointRowProps {
  index: number;
  joint: DraftJoint;
  isLast: boolean;
  isOnly: boolean;
  /** Fields of this joint that something is wrong with, with blanks between them: a text stays the same between renders. */
  invalid: string;
  onText: (path: string, text: string) => void;
  onMove: (index: number, move: JointMove) => void;
}

export const DraftJointRow = memo(function DraftJointRow({
  index,
  joint,
  isLast,
  isOnly,
  invalid,
  onText,
  onMove,
}: DraftJointRowProps) {
  const wrong = invalid.split(' ');
  const label = `Joint ${index + 1}`;
  const path = (field: string): string => `joints.${index}.${field}`;
  return (
    <tr className="border-t border-hair">
      <th scope="row" className={classNames('h-8 pl-3.5 text-left font-semibold', invalid && 'text-red')}>
        J{index + 1}
      </th>
      <td className="w-20 min-w-[4.5rem]">
        <select
          data-cell={path(GRID_FIELDS[0])}
          aria-label={`${label}, kind`}
          value={joint.type}
          onChange={(event) => onText(path('type'), event.target.value)}
          className={classNames(CELL_LOOK, 'appearance-none px-2')}
        >
          {Object.entries(KIND_WORDS).map(([value, word]) => (
            <option key={value} value={value}>
              {word}
            </option>
          ))}
        </select>
      </td>
      {JOINT_COLUMNS.map(({ field, name }) => (
        <td key={field} className="min-w-[4.25rem]">
          <DraftCellInput
            path={path(field)}
            label={`${label}, ${name}`}
            cell={joint.cells[field]}
            invalid={wrong.includes(field)}
            onText={onText}
          />
        </td>
      ))}
      <td className="w-9 pr-1">
        <Menu
          trigger={
            <Button variant="quiet" size="icon" aria-label={`Move or remove joint ${index + 1}`}>
              <Ellipsis aria-hidden className="size-4" />
            </Button>
          }
        >
          <MenuItem
            icon={<ArrowUp aria-hidden className="size-4" />}
            disabled={index === 0}
            onSelect={() => onMove(index, 'up')}
          >
            Move towards the base
          </MenuItem>
          <MenuItem
            icon={<ArrowDown aria-hidden className="size-4" />}
            disabled={isLast}
            onSelect={() => onMove(index, 'down')}
          >
            Move towards the tool
          </MenuItem>
          <MenuItem
            icon={<Trash2 aria-hidden className="size-4" />}
            danger
            disabled={isOnly}
            onSelect={() => onMove(index, 'remove')}
          >
            Remove joint {index + 1}
          </MenuItem>
        </Menu>
      </td>
    </tr>
  );
});
