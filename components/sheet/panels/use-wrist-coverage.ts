'use client';

import { useEffect, useState } from 'react';
import { coverageAt, type CoverageSoFar } from '@/lib/editor/plumb-figures';
import type { PlumbReading } from '@/lib/editor/plumb';

/** It begins once the plumb rests, and gives the page its turn after so much work. */
const REST_MS = 250;
const SLICE_MS = 7;

/** How many of all tool directions the spot is reached in, worked out in small portions; null before there is a first one. */
export function useWristCoverage(reading: PlumbReading): CoverageSoFar | null {
  const [found, setFound] = useState<{ readonly of: PlumbReading; readonly coverage: CoverageSoFar } | null>(null);
  useEffect(() => {
    let timer = setTimeout(begin, REST_MS);
    function begin() {
      const directions = coverageAt(reading);
      const slice = () => {
        const until = performance.now() + SLICE_MS;
        let coverage: CoverageSoFar | null = null;
        let ended = false;
        do {
          const { value, done } = directions.next();
          if (done) ended = true;
          else coverage = value;
        } while (!ended && performance.now() < until);
        if (coverage) setFound({ of: reading, coverage });
        if (!ended) timer = setTimeout(slice, SLICE_MS);
      };
      slice();
    }
    return () => clearTimeout(timer);
  }, [reading]);
  return found?.of === reading ? found.coverage : null;
}
