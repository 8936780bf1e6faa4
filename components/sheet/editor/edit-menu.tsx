'use client';

import { ChevronDown } from 'lucide-react';
import { Button } from '@/components/ui/button';
import { Menu, MenuItem, MenuRule } from '@/components/ui/menu';
import { useBoardSheet } from './board-context';
import { useClipboard } from './use-clipboard';
import { useSelectionCommands } from './use-selection-commands';

/** What can be done with what is chosen, for whoever does not know the keys, or has none. */
export function EditMenu() {
  const count = useBoardSheet((state) => state.selection.itemIds.length);
  const commands = useSelectionCommands();
  const { copy, cut, paste } = useClipboard();
  const isEmpty = count === 0;
  return (
    <Menu
      align="start"
      trigger={
        <Button variant="quiet" size="small" className="px-2">
          Edit
          <ChevronDown aria-hidden className="size-4" />
        </Button>
      }
    >
      <MenuItem shortcut="Ctrl A" onSelect={commands.selectAll}>
        Choose everything
      </MenuItem>
      <MenuItem shortcut="M" disabled={isEmpty} onSelect={commands.pickUp}>
        Pick up, to put down with a click
      </MenuItem>
      <MenuRule />
      <MenuItem shortcut="Ctrl X" disabled={isEmpty} onSelect={cut}>
        Cut
      </MenuItem>
      <MenuItem shortcut="Ctrl C" disabled={isEmpty} onSelect={copy}>
        Copy
      </MenuItem>
      <MenuItem shortcut="Ctrl V" onSelect={() => void paste()}>
        Paste
      </MenuItem>
      <MenuItem shortcut="Ctrl D" disabled={isEmpty} onSelect={commands.duplicate}>
        Duplicate
      </MenuItem>
      <MenuRule />
      <MenuItem shortcut="Ctrl G" disabled={count < 2} onSelect={commands.group}>
        Group
      </MenuItem>
      <MenuItem shortcut="Ctrl Shift G" disabled={isEmpty} onSelect={commands.ungroup}>
        Ungroup
      </MenuItem>
      <MenuRule />
      <MenuItem shortcut="B" disabled={isEmpty} onSelect={() => commands.toggle('locked')}>
        Lock or unlock
      </MenuItem>
      <MenuItem shortcut="Shift B" disabled={isEmpty} onSelect={() => commands.toggle('hidden')}>
        Hide or show
      </MenuItem>
      <MenuItem danger shortcut="Delete" disabled={isEmpty} onSelect={commands.remove}>
        Delete
      </MenuItem>
    </Menu>
  );
}
