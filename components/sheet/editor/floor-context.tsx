'use client';

import { createContext, useContext, useMemo, useState, type ReactNode } from 'react';
import type { MapEntry } from '@/lib/client/map-book';
import { useMaps } from '@/lib/client/use-maps';
import { keepSame } from '@/lib/editor/keep-same';
import { inOrder } from '@/lib/editor/order';
import { shownItems } from '@/lib/editor/sheet';
import type { MapTile } from '@/lib/kinematics/types';
import type { FloorMap, PlacedMap } from '@/lib/layout/floor-map';
import type { Item, Robot } from '@/lib/layout/items';
import type { LiveMap } from '@/lib/layout/live-map';
import { shownHeights, worstOfStack } from '@/lib/layout/map-stack';
import { useBoard, useBoardSettings, useBoardSheet } from './board-context';
import { FloorComposer } from './floor-composer';
import { useLiveMaps } from './use-live-maps';

export interface Floor {
  /** Best robot and value everywhere, robots standing where they are shown now; null while no map is there. */
  readonly floorMap: FloorMap | null;
  /** The robots of the composite, in its order. */
  readonly robots: readonly Robot[];
  readonly byRobot: ReadonlyMap<string, MapEntry>;
  /** All stored maps that the sheet waits for, those of a stack included, and how many are not there yet or will not come. */
  readonly entries: readonly MapEntry[];
  readonly unfinished: number;
  /** What is laid on the floor, for whoever wants its range of values. */
  readonly tiles: readonly MapTile[];
  /** Tool height over the floor of the first robot's map as it is laid; null without one. */
  readonly laidHeightMm: number | null;
  /** Some of it comes from the browser's own kernel, coarse, until the stored map is there. */
  readonly isLive: boolean;
  /** Robots that stand on the sheet. */
  readonly robotCount: number;
  /** A base is in the hand: what is costly to draw can wait. */
  readonly isDragging: boolean;
  readonly cancel: (key: string) => void;
  readonly retry: (key: string) => void;
}

const FloorContext = createContext<Floor | null>(null);

export function useFloor(): Floor {
  const floor = useContext(FloorContext);
  if (!floor) throw new Error('The floor map belongs inside its provider.');
  return floor;
}

const isRobot = (item: Item): item is Robot => item.kind === 'robot' && !item.hidden;

const NO_ROBOTS: readonly Robot[] = [];

/** The live map is only there while the stored one is not; what was stored before stays until the first live one comes. */
function oneMap(entry: MapEntry | undefined, live: LiveMap | undefined): LiveMap | null {
  if (live) return live;
  return entry?.tile && entry.map
    ? { grid: entry.map.grid, tile: entry.tile, toolHeightMm: entry.question.toolHeightMm }
    : null;
}

/** The worst of each robot's stack, where all of its maps are there. */
function worstByRobot(
  shownByRobot: ReadonlyMap<string, readonly MapEntry[]>,
  heightCount: number,
): ReadonlyMap<string, LiveMap> {
  const worst = new Map<string, LiveMap>();
  if (heightCount < 2) return worst;
  for (const [robotId, entries] of shownByRobot) {
    const tiles = entries.flatMap(({ tile }) => (tile ? [tile] : []));
    const { map } = entries[0];
    if (map && tiles.length === heightCount)
      worst.set(robotId, { grid: map.grid, tile: worstOfStack(tiles), toolHeightMm: entries[0].question.toolHeightMm });
  }
  return worst;
}

/**
 * Asks for the maps of the sheet's robots and lays them on the floor. Maps belong to base frames: a base that is dragged asks for
 * nothing, its map is only laid elsewhere.
 */
export function FloorProvider({ children }: { readonly children: ReactNode }) {
  const items = useBoardSheet((state) => state.items);
  const draft = useBoardSheet((state) => state.draft);
  const settings = useBoardSettings();
  const [composer] = useState(() => new FloorComposer());
  const settled = useMemo(() => inOrder(items).filter(isRobot), [items]);
  const { arms } = useBoard();
  const { byRobot, shownByRobot, entries, unfinished, cancel, retry } = useMaps(settled, settings);
  const heights = shownHeights(settings);
  const stacks = useMemo(() => worstByRobot(shownByRobot, heights.length), [shownByRobot, heights.length]);

  // The same robots while something else is dragged: the floor map is then not laid anew.
  const [keepRobots] = useState(keepSame<readonly Robot[]>);
  const shown = keepRobots(useMemo(() => inOrder(shownItems({ items, draft })).filter(isRobot), [items, draft]));
  const isOneHeight = heights.length === 1;
  const live = useLiveMaps(isOneHeight ? shown : NO_ROBOTS, settings, arms, byRobot);
  const laid = useMemo(() => {
    const placed: PlacedMap[] = [];
    const standing: Robot[] = [];
    let isLive = false;
    let laidHeightMm: number | null = null;
    for (const robot of shown) {
      const map = isOneHeight ? oneMap(byRobot.get(robot.id), live.get(robot.id)?.result) : stacks.get(robot.id);
      if (!map) continue;
      if (map === live.get(robot.id)?.result) isLive = true;
      placed.push({ robotId: robot.id, placement: robot, grid: map.grid, tile: map.tile });
      standing.push(robot);
      laidHeightMm ??= map.toolHeightMm + robot.riserMm;
    }
    const floorMap = composer.compose(placed, settings.stepMm, settings.measure);
    return { floorMap, robots: standing, tiles: placed.map(({ tile }) => tile), isLive, laidHeightMm };
  }, [shown, isOneHeight, byRobot, live, stacks, composer, settings.stepMm, settings.measure]);

  const isDragging = draft?.items.some(({ kind }) => kind === 'robot') ?? false;
  const floor = useMemo(
    () => ({ ...laid, byRobot, entries, unfinished, robotCount: settled.length, isDragging, cancel, retry }),
    [laid, byRobot, entries, unfinished, settled.length, isDragging, cancel, retry],
  );
  return <FloorContext value={floor}>{children}</FloorContext>;
}
