'use client';

import { useMemo, type ReactNode } from 'react';
import { MillimetresProvider, type MillimetreFormat } from '@/components/ui/millimetres-context';
import { useUnits } from '@/lib/client/use-units';
import { parseMeasure } from '@/lib/editor/measure-text';
import { MM_PER_UNIT, stepIn } from '@/lib/layout/length-units';

/** Gives fields and figures below it the reader's own unit of length, and the ways in which one may be typed. */
export function UnitsProvider({ children }: { readonly children: ReactNode }) {
  const { unit } = useUnits();
  const format = useMemo<MillimetreFormat>(
    () => ({
      unit,
      mmPerUnit: MM_PER_UNIT[unit],
      moreDecimals: unit === 'in' ? 2 : 0,
      read: (text) => {
        const parsed = parseMeasure(text, 'length', unit);
        return parsed.ok ? parsed.value : null;
      },
      step: (stepMm) => stepIn(stepMm, unit),
    }),
    [unit],
  );
  return <MillimetresProvider value={format}>{children}</MillimetresProvider>;
}
