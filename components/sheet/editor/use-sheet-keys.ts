'use client';

import { useEffect } from 'react';
import { commandOf, type Command } from '@/lib/editor/shortcuts';
import { useBoard } from './board-context';
import { sheetBounds } from './sheet-bounds';
import { usePlace } from './use-place';
import { useSelectionCommands } from './use-selection-commands';

/** Keys typed into a field, or pressed in an open dialog or menu, belong there. */
function belongsElsewhere(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    target.closest('input, textarea, select, [contenteditable], [role="dialog"], [role="menu"], [role="listbox"]') !==
      null
  );
}

/** Enter and Space press the button that has the keyboard; arrows walk inside lists, groups and toolbars. */
function isForControl(event: KeyboardEvent): boolean {
  const target = event.target;
  if (!(target instanceof HTMLElement)) return false;
  if (event.key === 'Enter' || event.key === ' ') return target.closest('button, a, summary') !== null;
  return (
    event.key.startsWith('Arrow') && target.closest('[role="radiogroup"], [role="slider"], [role="tablist"]') !== null
  );
}

/** Keys of the whole page while a sheet is on the board. */
export function useSheetKeys(onHelp: () => void): void {
  const { sheet, view, floorPlan, arms } = useBoard();
  const commands = useSelectionCommands();
  const { take } = usePlace();

  useEffect(() => {
    const run = (command: Command) => {
      switch (command.name) {
        case 'undo':
          return sheet.undo();
        case 'redo':
          return sheet.redo();
        case 'delete':
          return commands.remove();
        case 'duplicate':
          return commands.duplicate();
        case 'selectAll':
          return commands.selectAll();
        case 'group':
          return commands.group();
        case 'ungroup':
          return commands.ungroup();
        case 'pickUp':
          return commands.pickUp();
        case 'lock':
          return commands.toggle('locked');
        case 'hide':
          return commands.toggle('hidden');
        case 'cancel':
          return sheet.cancel();
        case 'finish':
          return sheet.finish();
        case 'fit':
          return view.fit(sheetBounds(sheet.getState().items, arms, floorPlan));
        case 'help':
          return onHelp();
        case 'tool':
          return take(command.tool);
        case 'nudge':
          return commands.nudge(command.xSteps, command.ySteps);
        case 'turn':
          return commands.turn(command.steps);
      }
    };
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.defaultPrevented || belongsElsewhere(event.target) || isForControl(event)) return;
      const command = commandOf(event);
      if (!command) return;
      event.preventDefault();
      run(command);
    };
    window.addEventListener('keydown', onKeyDown);
    return () => window.removeEventListener('keydown', onKeyDown);
  }, [sheet, view, floorPlan, arms, commands, take, onHelp]);
}
