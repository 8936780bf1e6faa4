'use client';

import { createContext, useContext, useMemo, useState, type ReactNode } from 'react';
import type { MapEntry } from '@/lib/client/map-book';
import { useMaps } from '@/lib/client/use-maps';
import { inOrder } from '@/lib/editor/order';
import { shownItems } from '@/lib/editor/sheet';
import type { FloorMap, PlacedMap } from '@/lib/layout/floor-map';
import type { Item, Robot } from '@/lib/layout/items';
import { useBoardSettings, useBoardSheet } from './board-context';
import { FloorComposer } from './floor-composer';

export interface Floor {
  /** Best robot and value everywhere, robots standing where they are shown now; null while no map is there. */
  readonly floorMap: FloorMap | null;
  /** The robots of the composite, in its order. */
  readonly robots: readonly Robot[];
  readonly byRobot: ReadonlyMap<string, MapEntry>;
  /** Robots whose map is not there yet, or will not come. */
  readonly unfinished: number;
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
  const { byRobot, cancel, retry } = useMaps(settled, settings);

  const shown = useMemo(() => inOrder(shownItems({ items, draft })).filter(isRobot), [items, draft]);
  const { floorMap, robots } = useMemo(() => {
    const placed: PlacedMap[] = [];
    const standing: Robot[] = [];
    for (const robot of shown) {
      const entry = byRobot.get(robot.id);
      if (!entry?.tile || !entry.map) continue;
      placed.push({ robotId: robot.id, placement: robot, grid: entry.map.grid, tile: entry.tile });
      standing.push(robot);
    }
    return { floorMap: composer.compose(placed, settings.stepMm, settings.measure), robots: standing };
  }, [shown, byRobot, composer, settings.stepMm, settings.measure]);

  const isDragging = draft?.items.some(({ kind }) => kind === 'robot') ?? false;
  const unfinished = settled.filter(({ id }) => byRobot.get(id)?.state !== 'ready').length;
  const floor = useMemo(
    () => ({ floorMap, robots, byRobot, unfinished, robotCount: settled.length, isDragging, cancel, retry }),
    [floorMap, robots, byRobot, unfinished, settled.length, isDragging, cancel, retry],
  );
  return <FloorContext value={floor}>{children}</FloorContext>;
}
