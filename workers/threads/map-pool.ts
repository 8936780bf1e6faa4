import { fileURLToPath } from 'node:url';
import { Piscina } from 'piscina';
import type { MapComputer } from '@/lib/server/maps/computer';

/**
 * Threads that compute maps, so that a worker process stays free for mails, for the queue and for its signals while they
 * are busy. They start with the process, so that the first map does not wait for them.
 */
export function mapPool(threads: number): MapComputer & { readonly close: () => Promise<void> } {
  const pool = new Piscina({
    filename: fileURLToPath(new URL('./map-thread.mjs', import.meta.url)),
    minThreads: threads,
    maxThreads: threads,
  });
  return {
    computeTile: (task) => pool.run(task, { name: 'computeTile' }),
    summarise: (task) => pool.run(task, { name: 'summarise' }),
    close: () => pool.destroy(),
  };
}
