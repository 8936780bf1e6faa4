'use client';

import { Crosshair } from 'lucide-react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { NumberInput } from '@/components/ui/number-input';
import { pointOf, type Handle } from '@/lib/layout/calibration-draft';
import { HANDLE_MARKS, HANDLE_WORDS } from './step-words';
import type { CalibrationInHand } from './use-calibration';

/** One point as two typed pixel numbers, and the button that selects it on the picture. */
export function PointFields({ handle, calibration }: { handle: Handle; calibration: CalibrationInHand }) {
  const { draft, selected, deeds } = calibration;
  const point = pointOf(draft, handle);
  const name = HANDLE_WORDS[handle];
  const isSelected = handle === selected;
  const set = (axis: 0 | 1) => (value: number) =>
    deeds.move(handle, axis === 0 ? [value, point?.[1] ?? 0] : [point?.[0] ?? 0, value]);
  return (
    <div className="flex items-center gap-2">
      <Button
        size="icon"
        aria-pressed={isSelected}
        aria-label={`Select: ${name}`}
        // A point still to be picked stays selected: whoever presses this means to pick it.
        onClick={() => deeds.select(isSelected && point ? null : handle)}
        className={classNames('font-mono text-[0.8125rem]', isSelected && 'border-red! text-red!')}
      >
        {point ? HANDLE_MARKS[handle] : <Crosshair aria-hidden className="size-4" />}
      </Button>
      <NumberInput
        aria-label={`${name}, x`}
        value={point?.[0] ?? null}
        onCommit={set(0)}
        unit="px"
        decimals={2}
        className="flex-1"
      />
      <NumberInput
        aria-label={`${name}, y`}
        value={point?.[1] ?? null}
        onCommit={set(1)}
        unit="px"
        decimals={2}
        className="flex-1"
      />
    </div>
  );
}
