'use client';

import type { ReactNode } from 'react';
import { SegmentedControl } from '@/components/ui/segmented-control';
import type { Fixture, Obstacle, Zone } from '@/lib/layout/items';
import { cornersOf, rectangleOf, rectangleRound } from '@/lib/layout/rectangles';
import { CornerList } from './corner-list';
import { useItemEdit } from './use-item-edit';
import { ValueField } from './value-field';

type Outlined = Fixture | Obstacle | Zone;

/** The outline of a body: a rectangle by width and depth, or a polygon by its corners. `children` are further values of its size. */
export function OutlineFields({ item, children }: { readonly item: Outlined; readonly children?: ReactNode }) {
  const edit = useItemEdit<Outlined>(item);
  const rectangle = rectangleOf(item);
  const size = rectangle && { width: rectangle.maxX - rectangle.minX, depth: rectangle.maxY - rectangle.minY };
  /** Both sides move, so that the middle stays where it is. */
  const resize = (width: number, depth: number): string | null => {
    if (!rectangle) return null;
    if (width <= 0 || depth <= 0) return 'A side is longer than zero.';
    const [x, y] = [(rectangle.minX + rectangle.maxX) / 2, (rectangle.minY + rectangle.maxY) / 2];
    const outlineMm = cornersOf({ minX: x - width / 2, minY: y - depth / 2, maxX: x + width / 2, maxY: y + depth / 2 });
    return edit('Size', { outlineMm });
  };
  const shape = (form: 'rectangle' | 'polygon') =>
    form === 'polygon'
      ? edit('Outline', { cornersFree: true })
      : edit('Outline', { cornersFree: undefined, outlineMm: cornersOf(rectangleRound(item.outlineMm)) });
  return (
    <>
      <SegmentedControl
        label="Outline"
        className="mt-2"
        value={rectangle ? 'rectangle' : 'polygon'}
        disabled={item.locked}
        onValueChange={shape}
        options={[
          { value: 'rectangle', label: 'Rectangle' },
          { value: 'polygon', label: 'Polygon' },
        ]}
      />
      {(size || children) && (
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
          {children}
        </div>
      )}
      {!size && (
        <CornerList
          points={item.outlineMm}
          least={3}
          closed
          disabled={item.locked}
          onChange={(outlineMm) => edit('Outline', { outlineMm })}
        />
      )}
    </>
  );
}
