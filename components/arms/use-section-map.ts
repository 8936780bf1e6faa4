'use client';

import { useEffect, useState } from 'react';
import type { ArmDefinition } from '@/lib/contracts/arm';
import { sectionRow, type SectionGrid } from '@/lib/layout/arm-section';

/** Computing pauses after this long, so that the page answers in between. */
const SLICE_MS = 12;

/** The section map row by row from the lowest, in slices between the page's own work; grows until it has all rows. */
export function useSectionMap(arm: ArmDefinition, grid: SectionGrid): readonly Float32Array[] {
  const [rows, setRows] = useState<readonly Float32Array[]>([]);
  useEffect(() => {
    const done: Float32Array[] = [];
    let timer: ReturnType<typeof setTimeout>;
    const work = (): void => {
      const until = performance.now() + SLICE_MS;
      while (done.length < grid.rows && performance.now() < until) done.push(sectionRow(arm, grid, done.length));
      setRows([...done]);
      if (done.length < grid.rows) timer = setTimeout(work);
    };
    timer = setTimeout(work);
    return () => clearTimeout(timer);
  }, [arm, grid]);
  return rows;
}
