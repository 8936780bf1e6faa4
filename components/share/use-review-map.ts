'use client';

import { useMemo } from 'react';
import type { SheetDocument } from '@/lib/client/sheet-document';
import type { StoredMap } from '@/lib/client/use-stored-maps';
import { composeFloorMap, floorGridOf, type FloorMap, type PlacedMap } from '@/lib/layout/floor-map';
import type { Robot } from '@/lib/layout/items';
import { valueRange, type ValueRange } from '@/lib/layout/scales';

export interface ReviewMap {
  readonly map: FloorMap | null;
  readonly range: ValueRange;
  readonly threshold: number | null;
  readonly isoLines: readonly number[] | null;
}

const ISO_SHARES = [0.25, 0.5, 0.75];

/** The maps that a revision kept, laid on its floor. */
export function useReviewMap(
  { settings }: SheetDocument,
  robots: readonly Robot[],
  maps: ReadonlyMap<string, StoredMap> | null,
): ReviewMap {
  return useMemo(() => {
    const { measure, stepMm, thresholds } = settings;
    const placed = robots.flatMap((robot): PlacedMap[] => {
      const stored = maps?.get(robot.id);
      return stored ? [{ robotId: robot.id, placement: robot, ...stored }] : [];
    });
    const grid = floorGridOf(placed, stepMm);
    const map = grid && composeFloorMap(grid, placed, measure);
    const range = map ? valueRange(measure, map.value) : { from: 0, to: 1 };
    return {
      map,
      range,
      threshold: measure === 'reach' ? null : thresholds[measure],
      isoLines: measure === 'reach' ? null : ISO_SHARES.map((share) => range.from + share * (range.to - range.from)),
    };
  }, [settings, robots, maps]);
}
