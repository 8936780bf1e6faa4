'use client';

import { useEffect, useMemo, useRef, useState, useSyncExternalStore } from 'react';
import type { LibraryArm } from '@/lib/contracts/arms';
import { KernelDesk, type DeskAnswer, type DeskJob } from '@/lib/client/kernel-desk';
import { keyOf, type MapEntry } from '@/lib/client/map-book';
import type { Robot } from '@/lib/layout/items';
import type { LiveMap, LiveMapTask } from '@/lib/layout/live-map';
import { questionOfRobot } from '@/lib/layout/map-question';
import type { MapSettings } from '@/lib/layout/map-settings';
import type { KernelAnswer } from './kernel-worker';

export type LiveMaps = ReadonlyMap<string, DeskAnswer<LiveMap>>;

/**
 * Maps from the browser's own kernel for robots whose stored map is not the one asked for now: while a riser, a height or an
 * angle is dragged, and until the server has answered. By robot id; an answer may be a moment behind the hand.
 */
export function useLiveMaps(
  robots: readonly Robot[],
  settings: MapSettings,
  arms: ReadonlyMap<string, LibraryArm>,
  stored: ReadonlyMap<string, MapEntry>,
): LiveMaps {
  const worker = useRef<Worker | null>(null);
  const [desk] = useState(() => new KernelDesk<LiveMapTask, LiveMap>((task) => worker.current?.postMessage(task)));
  useEffect(
    () => () => {
      worker.current?.terminate();
      worker.current = null;
      // What it had in hand will never come.
      desk.want([]);
      desk.fail();
    },
    [desk],
  );

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
  useEffect(() => {
    // Old browsers, and pages that may not start workers, wait for the stored map.
    if (typeof Worker === 'undefined') return;
    if (jobs.length > 0 && !worker.current) {
      worker.current = new Worker(new URL('./kernel-worker.ts', import.meta.url), { type: 'module' });
      worker.current.onmessage = ({ data }: MessageEvent<KernelAnswer>) =>
        data.kind === 'map' ? desk.take(data.map) : desk.fail();
      worker.current.onerror = () => desk.fail();
    }
    desk.want(jobs);
  }, [desk, jobs]);

  return useSyncExternalStore(desk.subscribe, desk.getAnswers, desk.getAnswers);
}
