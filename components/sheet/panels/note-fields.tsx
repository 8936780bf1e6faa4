'use client';

import type { Note } from '@/lib/layout/items';
import { TextBlock } from './text-field';
import { useItemEdit } from './use-item-edit';
import { ValueField } from './value-field';

export function NoteFields({ item }: { readonly item: Note }) {
  const edit = useItemEdit(item);
  return (
    <div className="mt-2 grid grid-cols-3 gap-x-3 gap-y-1.5">
      <TextBlock
        className="col-span-3"
        label="Words of the note"
        value={item.text}
        disabled={item.locked}
        onCommit={(text) => edit('Words', { text })}
      />
      <ValueField
        label="Letter height"
        kind="length"
        value={item.sizeMm}
        step={10}
        disabled={item.locked}
        onCommit={(sizeMm) => edit('Letter height', { sizeMm })}
      />
    </div>
  );
}
