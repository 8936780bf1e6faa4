'use client';

import { createContext, useContext } from 'react';

/** How a length that is kept in millimetres is written and read. */
export interface MillimetreFormat {
  readonly unit: string;
  readonly mmPerUnit: number;
  /** Digits after the point beyond those that millimetres need. */
  readonly moreDecimals: number;
  /** Millimetres of what was typed, with or without a unit; null where it is no length. */
  readonly read: (text: string) => number | null;
  /** What an arrow key adds, in millimetres, where a millimetre field would add `stepMm`. */
  readonly step: (stepMm: number) => number;
}

const MillimetresContext = createContext<MillimetreFormat | null>(null);

export const MillimetresProvider = MillimetresContext.Provider;

/** Null where nobody chose another unit: millimetres are then written as they are. */
export function useMillimetres(): MillimetreFormat | null {
  return useContext(MillimetresContext);
}
