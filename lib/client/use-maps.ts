'use client';

import { useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import { dexterityMapSchema } from '@/lib/contracts/maps';
import type { Robot } from '@/lib/layout/items';
import { questionOfRobot } from '@/lib/layout/map-question';
import type { MapSettings } from '@/lib/layout/map-settings';
import { browserTimer } from './browser-timer';
import { fetcher, sayError, send } from './fetcher';
import { isPassing } from './layout-transport';
import { keyOf, MapBook, type MapEntry } from './map-book';
import { fetchMapTile } from './map-tiles';

export interface SheetMaps {
  /** The entry of every robot that was asked for, by the robot's id. */
  readonly byRobot: ReadonlyMap<string, MapEntry>;
  readonly cancel: (key: string) => void;
  readonly retry: (key: string) => void;
}

const address = (mapId: string) => `/api/maps/${encodeURIComponent(mapId)}`;

function serverBook(): MapBook {
  return new MapBook({
    ask: (question) => send('POST', '/api/maps', question, dexterityMapSchema),
    look: (mapId) => fetcher(address(mapId), dexterityMapSchema),
    cancel: (mapId) => send('POST', `${address(mapId)}/cancel`, undefined, dexterityMapSchema),
    retry: (mapId) => send('POST', `${address(mapId)}/retry`, undefined, dexterityMapSchema),
    fetchTile: fetchMapTile,
    judge: (error) => ({ passing: isPassing(error), words: sayError(error) }),
    timer: browserTimer,
  });
}

/** Settings that are being typed or dragged are asked for once they rest. */
const REST_MS = 300;

function useRested<T>(value: T): T {
  const [rested, setRested] = useState(value);
  useEffect(() => browserTimer(() => setRested(value), REST_MS), [value]);
  return rested;
}

/**
 * The maps of a sheet's robots at the sheet's settings. Only what a question depends on is asked: robots that are moved, or two
 * alike, ask nothing new.
 */
export function useMaps(robots: readonly Robot[], settings: MapSettings): SheetMaps {
  const [book] = useState(serverBook);
  useEffect(() => () => book.stop(), [book]);

  const wantedText = useMemo(
    () => JSON.stringify(robots.map((robot) => [robot.id, questionOfRobot(robot, settings)])),
    [robots, settings],
  );
  const restedText = useRested(wantedText);
  const wanted = useMemo(() => JSON.parse(restedText) as [string, ReturnType<typeof questionOfRobot>][], [restedText]);
  useEffect(() => book.want(wanted.map(([, question]) => question)), [book, wanted]);

  const entries = useSyncExternalStore(book.subscribe, book.getEntries, book.getEntries);
  const byRobot = useMemo(() => {
    const pairs = wanted.map(([robotId, question]) => [robotId, entries.get(keyOf(question))] as const);
    return new Map(pairs.filter((pair): pair is readonly [string, MapEntry] => pair[1] !== undefined));
  }, [wanted, entries]);

  return useMemo(
    () => ({
      byRobot,
      cancel: (key) => void book.cancel(key),
      retry: (key) => void book.retry(key),
    }),
    [byRobot, book],
  );
}
