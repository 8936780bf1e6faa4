'use client';

import { useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import { dexterityMapSchema } from '@/lib/contracts/maps';
import type { Robot } from '@/lib/layout/items';
import { questionOfRobot } from '@/lib/layout/map-question';
import type { MapQuestion } from '@/lib/layout/map-question-schema';
import type { MapSettings } from '@/lib/layout/map-settings';
import { heightsOf, shownHeights } from '@/lib/layout/map-stack';
import { browserTimer } from './browser-timer';
import { fetcher, sayError, send } from './fetcher';
import { isPassing } from './layout-transport';
import { keyOf, MapBook, type MapEntry } from './map-book';
import { fetchMapTile } from './map-tiles';

export interface SheetMaps {
  /** The entry of every robot at the height shown, by the robot's id. */
  readonly byRobot: ReadonlyMap<string, MapEntry>;
  /** The entries of every robot at the heights that the worst of the stack is taken of, lowest first; one without a stack. */
  readonly shownByRobot: ReadonlyMap<string, readonly MapEntry[]>;
  /** All entries that the sheet waits for, and how many of them are not there yet. */
  readonly entries: readonly MapEntry[];
  readonly unfinished: number;
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

interface Wanted {
  readonly robotId: string;
  readonly question: MapQuestion;
  /** At the height that the sheet is set to; among the heights that are shown. */
  readonly isSet: boolean;
  readonly isShown: boolean;
}

function wantedOf(robot: Robot, settings: MapSettings): Wanted[] {
  const shown = shownHeights(settings);
  return heightsOf(settings).map((toolHeightMm) => ({
    robotId: robot.id,
    question: questionOfRobot(robot, { ...settings, toolHeightMm }),
    isSet: toolHeightMm === settings.toolHeightMm,
    isShown: shown.includes(toolHeightMm),
  }));
}

function sorted(wanted: readonly Wanted[], all: ReadonlyMap<string, MapEntry>) {
  const byRobot = new Map<string, MapEntry>();
  const shownByRobot = new Map<string, MapEntry[]>();
  const entries: MapEntry[] = [];
  for (const { robotId, question, isSet, isShown } of wanted) {
    const entry = all.get(keyOf(question));
    if (!entry) continue;
    entries.push(entry);
    if (isSet) byRobot.set(robotId, entry);
    if (isShown) shownByRobot.set(robotId, [...(shownByRobot.get(robotId) ?? []), entry]);
  }
  const ready = entries.filter(({ state }) => state === 'ready').length;
  return { byRobot, shownByRobot, entries, unfinished: wanted.length - ready };
}

/**
 * The maps of a sheet's robots at the sheet's settings. Only what a question depends on is asked: robots that are moved, or two
 * alike, ask nothing new.
 */
export function useMaps(robots: readonly Robot[], settings: MapSettings): SheetMaps {
  const [book] = useState(serverBook);
  useEffect(() => () => book.stop(), [book]);

  const wantedText = useMemo(
    () => JSON.stringify(robots.flatMap((robot) => wantedOf(robot, settings))),
    [robots, settings],
  );
  const restedText = useRested(wantedText);
  const wanted = useMemo(() => JSON.parse(restedText) as Wanted[], [restedText]);
  useEffect(() => book.want(wanted.map(({ question }) => question)), [book, wanted]);

  const entries = useSyncExternalStore(book.subscribe, book.getEntries, book.getEntries);
  const found = useMemo(() => sorted(wanted, entries), [wanted, entries]);

  return useMemo(
    () => ({
      ...found,
      cancel: (key) => void book.cancel(key),
      retry: (key) => void book.retry(key),
    }),
    [found, book],
  );
}
