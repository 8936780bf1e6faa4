'use client';

import { useMemo, useSyncExternalStore } from 'react';
import { lengthFigure, lengthWords, type LengthUnit } from '@/lib/layout/length-units';

/** Kept in the browser: it is a reader's own way of reading, and no part of any document. */
const KEY = 'elbowroom-units';
const listeners = new Set<() => void>();
let chosen: LengthUnit | null = null;

function read(): LengthUnit {
  if (chosen) return chosen;
  try {
    chosen = localStorage.getItem(KEY) === 'in' ? 'in' : 'mm';
  } catch {
    // A browser that keeps nothing still shows millimetres.
    chosen = 'mm';
  }
  return chosen;
}

function tell(): void {
  for (const listener of [...listeners]) listener();
}

export function chooseUnit(unit: LengthUnit): void {
  chosen = unit;
  try {
    localStorage.setItem(KEY, unit);
  } catch {
    // Holds for this page at least.
  }
  tell();
}

function subscribe(listener: () => void): () => void {
  // Another window of the same reader chose anew.
  const onStorage = (event: StorageEvent) => {
    if (event.key !== KEY && event.key !== null) return;
    chosen = null;
    listener();
  };
  listeners.add(listener);
  window.addEventListener('storage', onStorage);
  return () => {
    listeners.delete(listener);
    window.removeEventListener('storage', onStorage);
  };
}

const onServer = (): LengthUnit => 'mm';

export interface Units {
  readonly unit: LengthUnit;
  /** `2500 mm` or `98.43 in`; digits are those of the millimetre. */
  readonly length: (mm: number, mmDigits?: number) => string;
  /** The same without the unit. */
  readonly figure: (mm: number, mmDigits?: number) => string;
}

/** The unit in which this reader wants lengths, everywhere in the product. */
export function useUnits(): Units {
  const unit = useSyncExternalStore(subscribe, read, onServer);
  return useMemo(
    () => ({
      unit,
      length: (mm, mmDigits) => lengthWords(mm, unit, mmDigits),
      figure: (mm, mmDigits) => lengthFigure(mm, unit, mmDigits),
    }),
    [unit],
  );
}
