'use client';

import { useMemo, useSyncExternalStore } from 'react';
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
  const { byRobot } = useFloor();
  const { measure } = useBoardSettings();
  const { view } = useBoard();
  const readScale = () => view.get().mapScale;
  const scale = useSyncExternalStore(view.subscribe, readScale, readScale);
  return useMemo(() => {
    const tiles = [...byRobot.values()].flatMap(({ tile }) => (tile ? [tile] : []));
    const range = valueRange(measure, ...(measure === 'reach' ? [] : tiles.map((tile) => tile[measure])));
    const isoLines =
      measure === 'reach' ? null : ISO_SHARES.map((share) => range.from + share * (range.to - range.from));
    return { scale, range, isoLines };
  }, [byRobot, measure, scale]);
}
