'use client';

import { useMemo, useSyncExternalStore } from 'react';
import { lengthFigure, lengthWords, type LengthUnit } from '@/lib/layout/length-units';
import { keptChoice } from './kept-choice';

const choice = keptChoice<LengthUnit>('elbowroom-units', (text) => (text === 'in' ? 'in' : 'mm'));

export const chooseUnit = choice.choose;

const onServer = (): LengthUnit => 'mm';

export interface Units {
  readonly unit: LengthUnit;
  /** `2500 mm` or `98.43 in`; digits are those of the millimetre. */
  readonly length: (mm: number, mmDigits?: number) => string;
  /** The same without the unit. */
  readonly figure: (mm: number, mmDigits?: number) => string;
}

/** The unit in which this reader wants lengths, everywhere in the product: a way of reading, and no part of any document. */
export function useUnits(): Units {
  const unit = useSyncExternalStore(choice.subscribe, choice.read, onServer);
  return useMemo(
    () => ({
      unit,
      length: (mm, mmDigits) => lengthWords(mm, unit, mmDigits),
      figure: (mm, mmDigits) => lengthFigure(mm, unit, mmDigits),
    }),
    [unit],
  );
}
