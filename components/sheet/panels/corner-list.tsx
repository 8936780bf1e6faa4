'use client';

import { Plus, Trash2 } from 'lucide-react';
import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { tidy } from '@/lib/editor/snapping';
import { ValueField } from './value-field';

type Points = [number, number][];

interface CornerListProps {
  readonly points: Points;
  /** Fewest points that the thing can have. */
  readonly least: number;
  /** Whether a side runs from the last corner back to the first. */
  readonly closed?: boolean;
  readonly disabled?: boolean;
  /** Takes the corners, or answers why they cannot be taken. */
  readonly onChange: (points: Points) => string | null;
}

/** Beyond the last corner of an open line a new one is put this far on, mm. */
const ONWARD_MM = 500;

/** A corner after this one: in the middle of the side to the next, or onward from the end of an open line. */
function cornerAfter(points: Points, index: number, closed: boolean): [number, number] {
  const [x, y] = points[index];
  const isEnd = index === points.length - 1;
  if (isEnd && !closed) {
    const [beforeX, beforeY] = points[index - 1];
    const length = Math.hypot(x - beforeX, y - beforeY) || 1;
    return [tidy(x + ((x - beforeX) / length) * ONWARD_MM), tidy(y + ((y - beforeY) / length) * ONWARD_MM)];
  }
  const [nextX, nextY] = points[(index + 1) % points.length];
  return [tidy((x + nextX) / 2), tidy((y + nextY) / 2)];
}

/** The corners of an outline or a line, typed one by one; measured from the item's place. */
export function CornerList({ points, least, closed = false, disabled, onChange }: CornerListProps) {
  const [fault, setFault] = useState<string | null>(null);
  const set = (index: number, axis: 0 | 1, value: number) => {
    setFault(null);
    return onChange(
      points.map((point, at): [number, number] =>
        at !== index ? point : axis === 0 ? [value, point[1]] : [point[0], value],
      ),
    );
  };
  const insertAfter = (index: number) =>
    setFault(onChange([...points.slice(0, index + 1), cornerAfter(points, index, closed), ...points.slice(index + 1)]));
  return (
    <div className="mt-2">
      <p className="text-[0.8125rem] text-ink-soft">Corners, from its place</p>
      <ol className="max-h-56 overflow-y-auto">
        {points.map(([x, y], index) => (
          <li key={index} className="grid grid-cols-[1.25rem_1fr_1fr_1.75rem_1.75rem] items-end gap-x-2">
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
              disabled={disabled}
              aria-label={`Add a corner after ${index + 1}`}
              onClick={() => insertAfter(index)}
            >
              <Plus aria-hidden className="size-3.5" />
            </Button>
            <Button
              variant="quiet"
              size="icon"
              disabled={disabled || points.length <= least}
              aria-label={`Delete corner ${index + 1}`}
              onClick={() => setFault(onChange(points.filter((_, at) => at !== index)))}
            >
              <Trash2 aria-hidden className="size-3.5" />
            </Button>
          </li>
        ))}
      </ol>
      {fault && (
        <p role="alert" className="mt-0.5 text-[0.8125rem] leading-4 font-medium text-red">
          {fault}
        </p>
      )}
    </div>
  );
}
