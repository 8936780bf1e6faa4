import { JOINT_COLUMNS } from '@/lib/layout/arm-columns';
import type { ArmDraft } from './draft';
import { addJoint, MOST_JOINTS, setCell } from './edits';

/** The table of joints as a grid of cells, for moving about and pasting as in a spreadsheet. */

export const GRID_FIELDS = ['type', ...JOINT_COLUMNS.map(({ field }) => field)] as const;

export const cellPath = (row: number, column: number): string => `joints.${row}.${GRID_FIELDS[column]}`;

/** Row and column of a cell of the table; null for a cell that stands elsewhere. */
export function placeOf(path: string): { row: number; column: number } | null {
  const [part, row, field] = path.split('.');
  const column = GRID_FIELDS.findIndex((each) => each === field);
  return part === 'joints' && column >= 0 ? { row: Number(row), column } : null;
}

interface Keys {
  readonly key: string;
  readonly shiftKey: boolean;
  /** Whether the caret stands at that end of the text, so that an arrow key leaves the cell. */
  readonly atStart: boolean;
  readonly atEnd: boolean;
}

/** The cell that a key leads to, or null where the key is for the cell itself. */
export function cellAfter(draft: ArmDraft, path: string, { key, shiftKey, atStart, atEnd }: Keys): string | null {
  const place = placeOf(path);
  if (!place) return null;
  const { row, column } = place;
  const down = key === 'ArrowDown' || (key === 'Enter' && !shiftKey);
  const up = key === 'ArrowUp' || (key === 'Enter' && shiftKey);
  if (down) return row + 1 < draft.joints.length ? cellPath(row + 1, column) : null;
  if (up) return row > 0 ? cellPath(row - 1, column) : null;
  if (key === 'ArrowLeft' && atStart) return column > 0 ? cellPath(row, column - 1) : null;
  if (key === 'ArrowRight' && atEnd) return column + 1 < GRID_FIELDS.length ? cellPath(row, column + 1) : null;
  return null;
}

/** Whether a clipboard text is a block of cells and not the text of one. */
export const isBlock = (text: string): boolean => /[\t\n]/.test(text.replace(/\r?\n$/, ''));

/**
 * Fills cells from a block out of a spreadsheet, from `path` to the right and down. Rows below the last joint become new ones; what
 * would lie right of the table or beyond the twelfth joint is left out.
 */
export function pasteBlock(draft: ArmDraft, path: string, text: string): ArmDraft {
  const place = placeOf(path);
  if (!place) return draft;
  const lines = text.replace(/\r?\n$/, '').split(/\r?\n/);
  let next = draft;
  lines.forEach((line, down) => {
    const row = place.row + down;
    if (row >= MOST_JOINTS) return;
    if (row >= next.joints.length) next = addJoint(next);
    line.split('\t').forEach((cell, right) => {
      if (place.column + right < GRID_FIELDS.length)
        next = setCell(next, cellPath(row, place.column + right), cell.trim());
    });
  });
  return next;
}
