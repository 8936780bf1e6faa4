'use client';

import { useMemo, useState, useSyncExternalStore } from 'react';
import type { MapMeasure } from '@/lib/layout/map-settings';
import { valueRange, type MapScale, type ValueRange } from '@/lib/layout/scales';
import { useBoard, useBoardSettings } from './board-context';
import { useFloor } from './floor-context';

export interface MapLook {
  readonly scale: MapScale;
  /** Fixed while a base is dragged: it comes from the robots' maps, not from how they overlap. */
  readonly range: ValueRange;
  readonly isoLines: readonly number[] | null;
}

/** Lines of equal value at round parts of the range. */
const ISO_SHARES = [0.25, 0.5, 0.75];

/** How the floor map is coloured. */
export function useMapLook(): MapLook {
  const { tiles, isLive } = useFloor();
  const [ranges] = useState(() => new SteadyRange());
  const { measure } = useBoardSettings();
  const { view } = useBoard();
  const readScale = () => view.get().mapScale;
  const scale = useSyncExternalStore(view.subscribe, readScale, readScale);
  return useMemo(() => {
    const found = valueRange(measure, ...(measure === 'reach' ? [] : tiles.map((tile) => tile[measure])));
    const range = ranges.of(measure, found, isLive);
    const isoLines =
      measure === 'reach' ? null : ISO_SHARES.map((share) => range.from + share * (range.to - range.from));
    return { scale, range, isoLines };
  }, [tiles, isLive, ranges, measure, scale]);
}

/** The colours of a map that follows the hand do not jump: its range only grows until the stored map is there. */
class SteadyRange {
  private last: { readonly measure: MapMeasure; readonly range: ValueRange } | null = null;

  of(measure: MapMeasure, found: ValueRange, isLive: boolean): ValueRange {
    const { last } = this;
    const held = isLive && last?.measure === measure && last.range.to >= found.to ? last.range : found;
    const range = last?.measure === measure && same(last.range, held) ? last.range : held;
    this.last = { measure, range };
    return range;
  }
}

const same = (one: ValueRange, other: ValueRange): boolean => one.from === other.from && one.to === other.to;
