'use client';

import { Unlink } from 'lucide-react';
import { useBoardSheet } from '@/components/sheet/editor/board-context';
import { Button } from '@/components/ui/button';
import { detached, isAttached, settledDimension } from '@/lib/layout/attached-dimensions';
import type { Dimension, SectionLine } from '@/lib/layout/items';
import { TextLine } from './text-field';
import { useItemEdit } from './use-item-edit';
import { ValueField } from './value-field';

/** Where a dimension's free end lies and how far its line stands off; which items it follows. */
export function DimensionFields({ item }: { readonly item: Dimension }) {
  const edit = useItemEdit(item);
  const items = useBoardSheet((state) => state.items);
  const itemOf = (id: string) => items.get(id);
  const settled = settledDimension(item, itemOf);
  const [toX, toY] = settled.toMm;
  const followed = [...new Set([item.fromItemId, item.toItemId])].flatMap((id) => itemOf(id ?? '')?.name ?? []);
  const letGo = () => {
    const free = detached(item, () => true, itemOf);
    if (!free) return;
    const { fromMm, toMm } = free;
    const none = { fromItemId: undefined, fromAnchorMm: undefined, toItemId: undefined, toAnchorMm: undefined };
    edit('Letting go', { fromMm, toMm, ...none });
  };
  const isToFree = item.toItemId === undefined;
  return (
    <>
      <div className="mt-2 grid grid-cols-3 gap-x-3">
        {isToFree && (
          <>
            <ValueField
              label="To x, from its place"
              kind="length"
              value={toX}
              disabled={item.locked}
              onCommit={(x) => edit('Second point', { toMm: [x, toY] })}
            />
            <ValueField
              label="To y"
              kind="length"
              value={toY}
              disabled={item.locked}
              onCommit={(y) => edit('Second point', { toMm: [toX, y] })}
            />
          </>
        )}
        <ValueField
          label="Stands off"
          kind="length"
          value={item.offsetMm}
          step={50}
          disabled={item.locked}
          onCommit={(offsetMm) => edit('Offset', { offsetMm })}
        />
      </div>
      {isAttached(item) && (
        <div className="mt-2 flex items-center justify-between gap-2">
          <p className="text-sm text-ink-soft">
            {followed.length > 0 ? `Follows ${followed.join(' and ')}` : 'What it followed is gone'}
          </p>
          <Button variant="quiet" size="small" disabled={item.locked} onClick={letGo} className="-mr-2.5">
            <Unlink aria-hidden className="size-4" /> Let go
          </Button>
        </div>
      )}
    </>
  );
}

export function SectionLineFields({ item }: { readonly item: SectionLine }) {
  const edit = useItemEdit(item);
  const end = (label: string, key: 'fromMm' | 'toMm', axis: 0 | 1) => (
    <ValueField
      label={label}
      kind="length"
      value={item[key][axis]}
      disabled={item.locked}
      onCommit={(value) => edit(label, { [key]: axis === 0 ? [value, item[key][1]] : [item[key][0], value] })}
    />
  );
  return (
    <div className="mt-2 grid grid-cols-3 gap-x-3 gap-y-1.5">
      <TextLine
        label="Letter"
        value={item.letter}
        disabled={item.locked}
        onCommit={(letter) => edit('Letter', { letter: letter.trim().toUpperCase() })}
      />
      <ValueField
        label="From height"
        kind="length"
        value={item.zFromMm}
        step={100}
        disabled={item.locked}
        onCommit={(zFromMm) => edit('From height', { zFromMm })}
      />
      <ValueField
        label="To height"
        kind="length"
        value={item.zToMm}
        step={100}
        disabled={item.locked}
        onCommit={(zToMm) => edit('To height', { zToMm })}
      />
      {end('Begins x', 'fromMm', 0)}
      {end('Begins y', 'fromMm', 1)}
      <span aria-hidden />
      {end('Ends x', 'toMm', 0)}
      {end('Ends y', 'toMm', 1)}
      <p className="col-span-3 text-[0.8125rem] text-ink-soft">
        x and y from its place. The arrows show the way one looks.
      </p>
    </div>
  );
}
