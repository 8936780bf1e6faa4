'use client';

import { Plus, Trash2 } from 'lucide-react';
import { Button } from '@/components/ui/button';
import { ValueField } from './value-field';

type Points = [number, number][];

interface CornerListProps {
  readonly points: Points;
  /** Fewest points that the thing can have. */
  readonly least: number;
  readonly disabled?: boolean;
  readonly onChange: (points: Points) => string | null;
}

/** The corners of an outline or a line, typed one by one; measured from the item's place. */
export function CornerList({ points, least, disabled, onChange }: CornerListProps) {
  const set = (index: number, axis: 0 | 1, value: number) =>
    onChange(
      points.map((point, at): [number, number] =>
        at !== index ? point : axis === 0 ? [value, point[1]] : [point[0], value],
      ),
    );
  const add = () => {
    const last = points[points.length - 1];
    onChange([...points, [last[0] + 500, last[1]]]);
  };
  return (
    <div className="mt-2">
      <p className="text-[0.8125rem] text-ink-soft">Corners, from its place</p>
      <ol className="max-h-56 overflow-y-auto">
        {points.map(([x, y], index) => (
          <li key={index} className="grid grid-cols-[1.25rem_1fr_1fr_2rem] items-end gap-x-3">
            <span className="pb-1 font-mono text-sm text-ink-soft">{index + 1}</span>
            <ValueField
              label={`Corner ${index + 1}, x`}
              kind="length"
              value={x}
              disabled={disabled}
              onCommit={(value) => set(index, 0, value)}
            />
            <ValueField
              label={`Corner ${index + 1}, y`}
              kind="length"
              value={y}
              disabled={disabled}
              onCommit={(value) => set(index, 1, value)}
            />
            <Button
              variant="quiet"
              size="icon"
              disabled={disabled || points.length <= least}
              aria-label={`Delete corner ${index + 1}`}
              onClick={() => onChange(points.filter((_, at) => at !== index))}
            >
              <Trash2 aria-hidden className="size-3.5" />
            </Button>
          </li>
        ))}
      </ol>
      <Button variant="quiet" size="small" disabled={disabled} onClick={add} className="mt-1 -ml-2.5">
        <Plus aria-hidden className="size-4" /> Add a corner
      </Button>
    </div>
  );
}
