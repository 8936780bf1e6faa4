'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { NumberInput } from '@/components/ui/number-input';
import type { ArmDraft } from '@/lib/editor/arm/draft';
import { fillRamps } from '@/lib/editor/arm/edits';
import type { ChangeDraft } from './draft-table';

/** Where ramps are missing: works them out from the speeds and the time to full speed that somebody states. */
export function RampFill({ draft, onChange }: { draft: ArmDraft; onChange: ChangeDraft }) {
  const [seconds, setSeconds] = useState<number | null>(null);
  const isNeeded = draft.joints.some(
    ({ cells }) => cells.maxAcceleration.text.trim() === '' && cells.maxSpeed.value > 0,
  );
  if (!isNeeded) return null;
  return (
    <div className="flex flex-wrap items-center gap-x-2.5 gap-y-1.5 border-t border-hair px-3.5 py-2">
      <label htmlFor="ramp-seconds">Ramps are missing. From rest to full speed in</label>
      <NumberInput
        id="ramp-seconds"
        className="w-24"
        unit="s"
        value={seconds}
        min={0.01}
        max={60}
        onValueChange={setSeconds}
      />
      <Button
        size="small"
        disabled={!seconds || seconds <= 0}
        onClick={() => seconds && onChange((old) => fillRamps(old, seconds))}
      >
        Fill in the ramps
      </Button>
    </div>
  );
}
