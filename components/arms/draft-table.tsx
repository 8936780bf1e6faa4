'use client';

import { useCallback, useRef, type ClipboardEvent, type KeyboardEvent } from 'react';
import { DataTable, HeadCell } from '@/components/ui/data-table';
import { VisuallyHidden } from '@/components/ui/visually-hidden';
import type { DraftProblem } from '@/lib/editor/arm/check';
import type { ArmDraft } from '@/lib/editor/arm/draft';
import { moveJoint, removeJoint, setCell } from '@/lib/editor/arm/edits';
import { cellAfter, isBlock, pasteBlock } from '@/lib/editor/arm/grid';
import { JOINT_COLUMNS } from '@/lib/layout/arm-columns';
import { DraftJointRow, type JointMove } from './draft-joint-row';
import { focusCell } from './focus-cell';

export type ChangeDraft = (change: (draft: ArmDraft) => ArmDraft) => void;

interface DraftTableProps {
  draft: ArmDraft;
  problems: readonly DraftProblem[];
  onChange: ChangeDraft;
}

/** The joints as a table to type in: arrow keys and Enter go from cell to cell, a block from a spreadsheet fills cells. */
export function DraftTable({ draft, problems, onChange }: DraftTableProps) {
  const table = useRef<HTMLDivElement>(null);
  const setText = useCallback((path: string, text: string) => onChange((old) => setCell(old, path, text)), [onChange]);
  const move = useCallback(
    (index: number, how: JointMove) =>
      onChange((old) => (how === 'remove' ? removeJoint(old, index) : moveJoint(old, index, how === 'up' ? -1 : 1))),
    [onChange],
  );

  const goOn = (event: KeyboardEvent): void => {
    const path = pathOf(event.target);
    if (!path || event.altKey || event.ctrlKey || event.metaKey) return;
    const isKind = event.target instanceof HTMLSelectElement;
    // An arrow key opens the list of kinds only together with Alt, as in every list.
    const { atStart, atEnd } = isKind ? { atStart: true, atEnd: true } : caretOf(event.target);
    const next = cellAfter(draft, path, { key: event.key, shiftKey: event.shiftKey, atStart, atEnd });
    const leads = event.key === 'Enter' || event.key === 'ArrowUp' || event.key === 'ArrowDown';
    if (next || (leads && isKind)) event.preventDefault();
    if (next) focusCell(table.current, next);
  };

  const paste = (event: ClipboardEvent): void => {
    const path = pathOf(event.target);
    const text = event.clipboardData.getData('text/plain');
    if (!path || !isBlock(text)) return;
    event.preventDefault();
    onChange((old) => pasteBlock(old, path, text));
  };

  return (
    <div ref={table} onKeyDown={goOn} onPaste={paste}>
      <DataTable caption="Joints, from the base to the tool">
        <thead>
          <tr>
            <HeadCell>
              <VisuallyHidden>Joint</VisuallyHidden>
            </HeadCell>
            <HeadCell className="px-2!">Kind</HeadCell>
            {JOINT_COLUMNS.map(({ field, label, name }) => (
              <HeadCell key={field} figures abbr={name} className={label.length < 2 ? 'px-2! font-mono' : 'px-2!'}>
                {label}
              </HeadCell>
            ))}
            <HeadCell>
              <VisuallyHidden>Order</VisuallyHidden>
            </HeadCell>
          </tr>
        </thead>
        <tbody>
          {draft.joints.map((joint, index) => (
            <DraftJointRow
              key={joint.key}
              index={index}
              joint={joint}
              isLast={index === draft.joints.length - 1}
              isOnly={draft.joints.length === 1}
              invalid={invalidFields(problems, `joints.${index}.`)}
              onText={setText}
              onMove={move}
            />
          ))}
        </tbody>
      </DataTable>
    </div>
  );
}

export function invalidFields(problems: readonly DraftProblem[], start: string): string {
  return problems
    .flatMap(({ paths }) => paths)
    .filter((path) => path.startsWith(start))
    .map((path) => path.slice(start.length))
    .join(' ');
}

const pathOf = (target: EventTarget): string | undefined =>
  target instanceof HTMLElement ? target.dataset.cell : undefined;

function caretOf(target: EventTarget): { atStart: boolean; atEnd: boolean } {
  if (!(target instanceof HTMLInputElement)) return { atStart: false, atEnd: false };
  const { selectionStart, selectionEnd, value } = target;
  // A cell that is chosen as a whole, as it is on entering it, is left at either side.
  return {
    atStart: selectionStart === 0,
    atEnd: selectionEnd === value.length,
  };
}
