'use client';

import { useBoardSheet } from '@/components/sheet/editor/board-context';
import { normalAngle } from '@/lib/editor/snapping';
import type { Item } from '@/lib/layout/items';
import { useItemEdit } from './use-item-edit';
import { ValueField } from './value-field';

/** Where an item stands and how it is turned. */
export function PlaceFields({ item }: { readonly item: Item }) {
  const edit = useItemEdit(item);
  const snapping = useBoardSheet((state) => state.snapping);
  const step = snapping.gridMm ?? 10;
  return (
    <div className="grid grid-cols-3 gap-x-3">
      <ValueField
        first
        label="x"
        kind="length"
        value={item.xMm}
        step={step}
        disabled={item.locked}
        onCommit={(xMm) => edit('x', { xMm })}
      />
      <ValueField
        label="y"
        kind="length"
        value={item.yMm}
        step={step}
        disabled={item.locked}
        onCommit={(yMm) => edit('y', { yMm })}
      />
      <ValueField
        label="Angle"
        kind="angle"
        value={item.angleDeg}
        step={snapping.angleDeg ?? 1}
        disabled={item.locked}
        onCommit={(angleDeg) =>
          Math.abs(angleDeg) > 36_000
            ? 'Write an angle between −360 and 360 degrees.'
            : edit('Angle', { angleDeg: normalAngle(angleDeg) })
        }
      />
    </div>
  );
}
