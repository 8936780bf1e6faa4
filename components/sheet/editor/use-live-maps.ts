'use client';

import { useMemo } from 'react';
import type { LibraryArm } from '@/lib/contracts/arms';
import type { DeskAnswer, DeskJob } from '@/lib/client/kernel-desk';
import { keyOf, type MapEntry } from '@/lib/client/map-book';
import type { Robot } from '@/lib/layout/items';
import type { LiveMap, LiveMapTask } from '@/lib/layout/live-map';
import { questionOfRobot } from '@/lib/layout/map-question';
import type { MapSettings } from '@/lib/layout/map-settings';
import { useKernelDesk } from './use-kernel-desk';

/**
 * Maps from the browser's own kernel for robots whose stored map is not the one asked for now: while a riser, a height or an
 * angle is dragged, and until the server has answered. By robot id; an answer may be a moment behind the hand.
 */
export function useLiveMaps(
  robots: readonly Robot[],
  settings: MapSettings,
  arms: ReadonlyMap<string, LibraryArm>,
  stored: ReadonlyMap<string, MapEntry>,
): ReadonlyMap<string, DeskAnswer<LiveMap>> {
  const jobs = useMemo(
    () =>
      robots.flatMap((robot): DeskJob<LiveMapTask>[] => {
        const arm = arms.get(robot.armId)?.definition;
        const question = questionOfRobot(robot, settings);
        const key = keyOf(question);
        const entry = stored.get(robot.id);
        if (!arm || (entry?.key === key && entry.tile)) return [];
        return [{ slot: robot.id, key, task: { question, arm } }];
      }),
    [robots, settings, arms, stored],
  );
  return useKernelDesk('map', jobs);
}
