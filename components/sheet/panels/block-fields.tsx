'use client';

import { rectangleOutline } from '@/lib/layout/geometry';
import type { Fixture, Obstacle } from '@/lib/layout/items';
import { CornerList } from './corner-list';
import { useItemEdit } from './use-item-edit';
import { ValueField } from './value-field';

/** Width and depth where the outline is a rectangle about its place; null for any other outline. */
export function rectangleSize(outline: Fixture['outlineMm']): { width: number; depth: number } | null {
  if (outline.length !== 4) return null;
  const xs = [...new Set(outline.map(([x]) => x))];
  const ys = [...new Set(outline.map(([, y]) => y))];
  if (xs.length !== 2 || ys.length !== 2 || xs[0] + xs[1] !== 0 || ys[0] + ys[1] !== 0) return null;
  return { width: Math.abs(xs[0] - xs[1]), depth: Math.abs(ys[0] - ys[1]) };
}

/** Size and height of a fixture or obstacle. */
export function BlockFields({ item }: { readonly item: Fixture | Obstacle }) {
  const edit = useItemEdit<Fixture | Obstacle>(item);
  const size = rectangleSize(item.outlineMm);
  const resize = (width: number, depth: number) =>
    width <= 0 || depth <= 0
      ? 'A side is longer than zero.'
      : edit('Size', { outlineMm: rectangleOutline(width, depth) });
  return (
    <>
      <div className="mt-2 grid grid-cols-4 gap-x-3">
        {size && (
          <>
            <ValueField
              label="Width"
              kind="length"
              value={size.width}
              step={50}
              disabled={item.locked}
              onCommit={(width) => resize(width, size.depth)}
            />
            <ValueField
              label="Depth"
              kind="length"
              value={size.depth}
              step={50}
              disabled={item.locked}
              onCommit={(depth) => resize(size.width, depth)}
            />
          </>
        )}
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
      </div>
      {!size && (
        <CornerList
          points={item.outlineMm}
          least={3}
          disabled={item.locked}
          onChange={(outlineMm) => edit('Outline', { outlineMm })}
        />
      )}
    </>
  );
}
