'use client';

import { ArrowDown, ArrowUp, Copy, Ellipsis, Eye, EyeOff, Group, Lock, LockOpen, Pencil, Trash2 } from 'lucide-react';
import { useRef, type KeyboardEvent } from 'react';
import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { useSelectionCommands } from '@/components/sheet/editor/use-selection-commands';
import { classNames } from '@/components/ui/class-names';
import { Menu, MenuItem, MenuRule } from '@/components/ui/menu';
import { inOrder } from '@/lib/editor/order';
import { chosen } from '@/lib/editor/tools/tool';
import type { Item } from '@/lib/layout/items';
import { useItemEdit } from './use-item-edit';
import { useItemNote } from './use-item-note';

/**
 * Everything on the sheet, by name: the full equal of the canvas for keyboard and screen reader. Up and down walk the rows,
 * Enter chooses, F2 goes to the typed values, Delete deletes, Ctrl+D duplicates, Alt with up and down reorders.
 */
export function ItemList() {
  const items = useBoardSheet((state) => state.items);
  const list = useRef<HTMLUListElement>(null);
  const ordered = inOrder(items);
  const onKeyDown = (event: KeyboardEvent) => {
    const by = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
    if (!by || event.altKey) return;
    const rows = [...(list.current?.querySelectorAll<HTMLElement>('[data-item-row]') ?? [])];
    const next = rows[rows.indexOf(event.target as HTMLElement) + by];
    if (!next) return;
    event.preventDefault();
    event.stopPropagation();
    next.focus();
  };
  return (
    <section aria-labelledby="on-this-sheet">
      <h2 id="on-this-sheet" className="px-3.5 pt-4 pb-1 text-[0.8125rem] font-medium text-ink-soft">
        On this sheet
      </h2>
      {ordered.length === 0 ? (
        <p className="px-3.5 pb-3 text-sm text-ink-soft">
          Nothing yet. Choose a robot above and click where its base stands.
        </p>
      ) : (
        <ul ref={list} onKeyDown={onKeyDown} className="pb-3">
          {ordered.map((item) => (
            <Row key={item.id} item={item} />
          ))}
        </ul>
      )}
    </section>
  );
}

function Row({ item }: { readonly item: Item }) {
  const { sheet, typeValues } = useBoard();
  const isChosen = useBoardSheet((state) => state.selection.itemIds.includes(item.id));
  const { duplicate, remove, reorder } = useSelectionCommands();
  const note = useItemNote(item);

  const choose = () => sheet.select(chosen(item.id));
  const onKeyDown = (event: KeyboardEvent) => {
    const commands: Record<string, (() => void) | undefined> = {
      F2: typeValues,
      Delete: remove,
      ArrowUp: event.altKey ? () => reorder(item.id, -1) : undefined,
      ArrowDown: event.altKey ? () => reorder(item.id, 1) : undefined,
      d: event.ctrlKey || event.metaKey ? duplicate : undefined,
    };
    const command = commands[event.key];
    if (!command) return;
    event.preventDefault();
    event.stopPropagation();
    choose();
    command();
  };

  return (
    <li
      className={classNames(
        'group relative border-l-[3px]',
        isChosen ? 'border-l-petrol bg-petrol-wash' : 'border-l-transparent hover:bg-petrol-wash',
        item.hidden && 'opacity-60',
      )}
    >
      <button
        type="button"
        data-item-row={item.id}
        data-item-kind={item.kind}
        aria-pressed={isChosen}
        onClick={(event) =>
          event.shiftKey ? sheet.select(chosen(...new Set([...sheet.getState().selection.itemIds, item.id]))) : choose()
        }
        onKeyDown={onKeyDown}
        className="block w-full py-1 pr-9 pl-[11px] text-left focus-visible:-outline-offset-2 pointer-coarse:min-h-11"
      >
        <span className="block truncate leading-5">{note.title}</span>
        <span
          className={classNames(
            'block truncate text-[0.8125rem] leading-4.5',
            note.tone === 'figures' && 'font-mono text-ink-soft',
            note.tone === 'soft' && 'text-ink-soft',
            note.tone === 'red' && 'text-red',
          )}
        >
          {item.groupId && (
            <Group role="img" aria-label="In a group." className="mr-1.5 inline size-3.5 align-[-2px] text-ink-soft" />
          )}
          {note.words}
        </span>
      </button>
      <RowMenu item={item} />
    </li>
  );
}

function RowMenu({ item }: { readonly item: Item }) {
  const { sheet, typeValues } = useBoard();
  const { duplicate, remove, reorder } = useSelectionCommands();
  const edit = useItemEdit(item);
  const withItem = (command: () => void) => () => {
    sheet.select(chosen(item.id));
    command();
  };
  return (
    <Menu
      align="start"
      trigger={
        <button
          type="button"
          aria-label={`Commands for ${item.name}`}
          className="absolute top-0.5 right-1 flex size-8 items-center justify-center opacity-0 group-hover:opacity-100 group-focus-within:opacity-100 hover:text-petrol focus-visible:-outline-offset-2 aria-expanded:opacity-100 pointer-coarse:size-11 pointer-coarse:opacity-100"
        >
          <Ellipsis aria-hidden className="size-4" />
        </button>
      }
    >
      <MenuItem icon={<Pencil className="size-4" />} shortcut="F2" onSelect={withItem(typeValues)}>
        Type its values
      </MenuItem>
      <MenuItem icon={<Copy className="size-4" />} shortcut="Ctrl D" onSelect={withItem(duplicate)}>
        Duplicate
      </MenuItem>
      <MenuRule />
      <MenuItem icon={<ArrowUp className="size-4" />} shortcut="Alt ↑" onSelect={() => reorder(item.id, -1)}>
        Move up the list
      </MenuItem>
      <MenuItem icon={<ArrowDown className="size-4" />} shortcut="Alt ↓" onSelect={() => reorder(item.id, 1)}>
        Move down the list
      </MenuItem>
      <MenuRule />
      <MenuItem
        icon={item.locked ? <LockOpen className="size-4" /> : <Lock className="size-4" />}
        onSelect={() => edit(item.locked ? 'Unlocking' : 'Locking', { locked: !item.locked })}
      >
        {item.locked ? 'Unlock' : 'Lock'}
      </MenuItem>
      <MenuItem
        icon={item.hidden ? <Eye className="size-4" /> : <EyeOff className="size-4" />}
        onSelect={() => edit(item.hidden ? 'Showing' : 'Hiding', { hidden: !item.hidden })}
      >
        {item.hidden ? 'Show' : 'Hide'}
      </MenuItem>
      <MenuItem
        danger
        icon={<Trash2 className="size-4" />}
        shortcut="Delete"
        disabled={item.locked}
        onSelect={withItem(remove)}
      >
        Delete
      </MenuItem>
    </Menu>
  );
}
