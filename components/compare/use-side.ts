'use client';

import { useMemo } from 'react';
import { mapWork } from '@/components/sheet/editor/map-work';
import type { MapWork } from '@/components/sheet/map-key/types';
import { useSheetReading, type SheetReading } from '@/components/sheet/reader/use-sheet-reading';
import type { SheetDocument } from '@/lib/client/sheet-document';
import { useMaps } from '@/lib/client/use-maps';
import { useStoredMaps } from '@/lib/client/use-stored-maps';
import type { PlacedMap } from '@/lib/layout/floor-map';
import type { Robot } from '@/lib/layout/items';
import type { MapSettings } from '@/lib/layout/map-settings';

export interface Side {
  readonly document: SheetDocument;
  readonly reading: SheetReading;
  readonly placed: readonly PlacedMap[];
  readonly work: MapWork;
  readonly cancel: () => void;
  readonly retry: () => void;
}

const NO_ROBOTS: readonly Robot[] = [];

/**
 * One sheet of a comparison with its maps at the common question. Those who may only look get the maps that the revision kept.
 */
export function useSide(document: SheetDocument | null, settings: MapSettings, mayAsk: boolean): Side | null {
  const reading = useSheetReading(document, settings.wrist);
  const robots = reading?.robots ?? NO_ROBOTS;
  const { byRobot, cancel, retry } = useMaps(mayAsk ? robots : NO_ROBOTS, settings);
  const {
    data: kept,
    error: keptError,
    mutate: readAgain,
  } = useStoredMaps('/api/maps', mayAsk ? null : (document?.storedMaps ?? null));

  const placed = useMemo(
    () =>
      robots.flatMap((robot): PlacedMap[] => {
        const asked = byRobot.get(robot.id);
        const read = kept?.get(robot.id);
        const grid = asked?.map?.grid ?? read?.grid;
        const tile = asked?.tile ?? read?.tile;
        return grid && tile ? [{ robotId: robot.id, placement: robot, grid, tile }] : [];
      }),
    [robots, byRobot, kept],
  );
  return useMemo(() => {
    if (!document || !reading) return null;
    const entries = [...byRobot.values()];
    const keys = (states: readonly string[]) =>
      new Set(entries.filter(({ state }) => states.includes(state)).map(({ key }) => key));
    const unfinished = robots.length - placed.length;
    return {
      document,
      reading,
      placed,
      work: mayAsk ? mapWork(entries, robots.length, unfinished) : storedWork(robots.length, document, keptError),
      cancel: () => keys(['queued', 'running']).forEach(cancel),
      retry: () => {
        keys(['failed', 'cancelled', 'unreachable']).forEach(retry);
        if (!mayAsk) void readAgain();
      },
    };
  }, [document, reading, placed, byRobot, robots, mayAsk, keptError, readAgain, cancel, retry]);
}

function storedWork(robotCount: number, document: SheetDocument, error: Error | undefined): MapWork {
  if (robotCount === 0) return { kind: 'noRobots' };
  if (error) return { kind: 'failed', reason: error.message };
  if (document.storedMaps.length < robotCount) {
    return { kind: 'failed', reason: 'This revision was issued before all of its maps were finished.' };
  }
  return { kind: 'none' };
}
