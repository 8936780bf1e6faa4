'use client';

import { Checkbox } from '@/components/ui/checkbox';
import type { Conveyor, GuardLine, Walkway } from '@/lib/layout/items';
import { CornerList } from './corner-list';
import { DoorList } from './door-list';
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
      <DoorList guard={item} />
      <CornerList
        points={item.pointsMm}
        least={2}
        closed={item.closed}
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

export function ConveyorFields({ item }: { readonly item: Conveyor }) {
  const edit = useItemEdit(item);
  return (
    <>
      <div className="mt-2 grid grid-cols-3 gap-x-3 gap-y-1.5">
        <ValueField
          label="Width"
          kind="length"
          value={item.widthMm}
          step={50}
          disabled={item.locked}
          onCommit={(widthMm) => edit('Width', { widthMm })}
        />
        <ValueField
          label="Underside"
          kind="length"
          value={item.zFromMm}
          step={50}
          disabled={item.locked}
          onCommit={(zFromMm) => edit('Underside', { zFromMm })}
        />
        <ValueField
          label="Carrying height"
          kind="length"
          value={item.zToMm}
          step={50}
          disabled={item.locked}
          onCommit={(zToMm) => edit('Carrying height', { zToMm })}
        />
        <ValueField
          className="col-span-2"
          label="Speed, 0 where not known"
          kind="number"
          unit="mm/s"
          value={item.speedMmS ?? 0}
          step={50}
          disabled={item.locked}
          onCommit={(speed) =>
            speed < 0 ? 'Write a speed above zero, or 0.' : edit('Speed', { speedMmS: speed === 0 ? null : speed })
          }
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
