import type { MapWork } from '@/components/sheet/map-key/types';
import type { MapEntry } from '@/lib/client/map-book';

/** The work of all robots' maps as one: the first trouble, else the sum. */
export function mapWork(entries: readonly MapEntry[], robotCount: number, unfinished: number): MapWork {
  if (robotCount === 0) return { kind: 'noRobots' };
  if (unfinished === 0) return { kind: 'none' };
  const trouble = entries.find(({ state }) => state === 'failed' || state === 'unreachable');
  if (trouble) return { kind: 'failed', reason: trouble.trouble ?? 'The map could not be computed. Try again.' };
  // Two robots alike wait for one and the same map.
  const distinct = [...new Map(entries.map((entry) => [entry.key, entry])).values()];
  const running = distinct.filter(({ state }) => state === 'running' || state === 'queued');
  if (running.some(({ state }) => state === 'running')) {
    const sum = (pick: (entry: MapEntry) => number) => running.reduce((total, entry) => total + pick(entry), 0);
    return {
      kind: 'running',
      done: sum(({ map }) => map?.progress.done ?? 0),
      total: sum(({ map }) => map?.progress.total ?? 0),
    };
  }
  if (entries.some(({ state }) => state === 'cancelled')) return { kind: 'cancelled' };
  return { kind: 'queued' };
}
