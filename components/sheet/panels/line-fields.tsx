'use client';

import { Checkbox } from '@/components/ui/checkbox';
import type { Dimension, GuardLine, Walkway } from '@/lib/layout/items';
import { CornerList } from './corner-list';
import { useItemEdit } from './use-item-edit';
import { ValueField } from './value-field';

export function GuardLineFields({ item }: { readonly item: GuardLine }) {
  const edit = useItemEdit(item);
  return (
    <>
      <div className="mt-2 grid grid-cols-3 items-end gap-x-3">
        <ValueField
          label="Height"
          kind="length"
          value={item.heightMm}
          step={100}
          disabled={item.locked}
          onCommit={(heightMm) => (heightMm < 0 ? 'A height is 0 or more.' : edit('Height', { heightMm }))}
        />
        <Checkbox
          className="col-span-2"
          label="Closed all round"
          checked={item.closed}
          disabled={item.locked}
          onCheckedChange={(closed) => edit('Closing', { closed })}
        />
      </div>
      <CornerList
        points={item.pointsMm}
        least={2}
        disabled={item.locked}
        onChange={(pointsMm) => edit('Corners', { pointsMm })}
      />
    </>
  );
}

export function WalkwayFields({ item }: { readonly item: Walkway }) {
  const edit = useItemEdit(item);
  return (
    <>
      <div className="mt-2 grid grid-cols-3 gap-x-3">
        <ValueField
          label="Clear width"
          kind="length"
          value={item.widthMm}
          step={50}
          disabled={item.locked}
          onCommit={(widthMm) => edit('Width', { widthMm })}
        />
      </div>
      <CornerList
        points={item.pointsMm}
        least={2}
        disabled={item.locked}
        onChange={(pointsMm) => edit('Corners', { pointsMm })}
      />
    </>
  );
}

export function DimensionFields({ item }: { readonly item: Dimension }) {
  const edit = useItemEdit(item);
  const [toX, toY] = item.toMm;
  return (
    <div className="mt-2 grid grid-cols-3 gap-x-3">
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
      <ValueField
        label="Stands off"
        kind="length"
        value={item.offsetMm}
        step={50}
        disabled={item.locked}
        onCommit={(offsetMm) => edit('Offset', { offsetMm })}
      />
    </div>
  );
}
