'use client';

import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Figure } from '@/components/ui/figure';
import { NumberInput } from '@/components/ui/number-input';
import { draftLengthPx, handlesOf, lineState, type LineName } from '@/lib/layout/calibration-draft';
import { PointFields } from './point-fields';
import type { CalibrationInHand } from './use-calibration';

/** A line of two points and, but for the level line, its length on the floor. */
export function LineStep({ line, calibration }: { line: LineName; calibration: CalibrationInHand }) {
  const { draft, deeds, faults } = calibration;
  const state = lineState(draft, line);
  const lengthPx = draftLengthPx(draft[line]);
  return (
    <>
      {handlesOf(line).map((handle) => (
        <PointFields key={handle} handle={handle} calibration={calibration} />
      ))}
      {line !== 'level' && (
        <Field label="Distance on the floor" inline>
          <NumberInput
            value={draft[line].distanceMm}
            onValueChange={(value) => deeds.setDistance(line, value)}
            unit="mm"
            decimals={2}
            step={10}
          />
        </Field>
      )}
      <p className="min-h-5 text-sm" aria-live="polite">
        {state !== 'empty' && faults[line] ? (
          <span className="font-medium text-amber">{faults[line]}</span>
        ) : (
          lengthPx !== null &&
          lengthPx > 0 && (
            <span className="text-ink-soft">
              <Figure value={lengthPx} decimals={1} unit="px" /> long; one pixel of aim is{' '}
              <Figure value={100 / lengthPx} decimals={2} unit="%" /> of it.
            </span>
          )
        )}
      </p>
      <div className="flex flex-wrap gap-2">
        {line === 'level' && state === 'empty' && lineState(draft, 'scale') !== 'empty' && (
          <Button size="small" onClick={() => deeds.copyLine('scale', 'level')}>
            Take the known distance’s line
          </Button>
        )}
        {state !== 'empty' && (
          <Button size="small" variant="quiet" onClick={() => deeds.clear(line)}>
            Pick again
          </Button>
        )}
      </div>
    </>
  );
}
