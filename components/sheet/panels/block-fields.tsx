'use client';

import { SegmentedControl } from '@/components/ui/segmented-control';
import type { Fixture, Obstacle } from '@/lib/layout/items';
import { OutlineFields } from './outline-fields';
import { useItemEdit } from './use-item-edit';
import { ValueField } from './value-field';

/** Outline and height of a fixture, an obstacle or a column. */
export function BlockFields({ item }: { readonly item: Fixture | Obstacle }) {
  const edit = useItemEdit<Fixture | Obstacle>(item);
  return (
    <>
      {item.kind === 'obstacle' && <FormChoice item={item} />}
      <OutlineFields item={item}>
        <ValueField
          label="Bottom"
          kind="length"
          value={item.zFromMm}
          step={50}
          disabled={item.locked}
          onCommit={(zFromMm) => edit('Bottom', { zFromMm })}
        />
        <ValueField
          label="Top"
          kind="length"
          value={item.zToMm}
          step={50}
          disabled={item.locked}
          onCommit={(zToMm) => edit('Top', { zToMm })}
        />
      </OutlineFields>
    </>
  );
}

function FormChoice({ item }: { readonly item: Obstacle }) {
  const edit = useItemEdit(item);
  return (
    <SegmentedControl
      label="What it is"
      className="mt-2 mr-2"
      value={item.form}
      disabled={item.locked}
      onValueChange={(form) => edit('Form', { form })}
      options={[
        { value: 'obstacle', label: 'Obstacle' },
        { value: 'column', label: 'Column' },
      ]}
    />
  );
}
