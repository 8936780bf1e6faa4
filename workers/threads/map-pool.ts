import { fileURLToPath } from 'node:url';
import { Piscina } from 'piscina';
import type { MapComputer } from '@/lib/server/maps/computer';
import type { StudyComputer } from '@/lib/server/studies/computer';

/**
 * Threads that compute maps and studies, so that a worker process stays free for mails, for the queue and for its signals while they
 * are busy. They start with the process, so that the first map does not wait for them.
 */
export function mapPool(threads: number): MapComputer & StudyComputer & { readonly close: () => Promise<void> } {
  const pool = new Piscina({
    filename: fileURLToPath(new URL('./map-thread.mjs', import.meta.url)),
    minThreads: threads,
    maxThreads: threads,
  });
  return {
    computeTile: (task) => pool.run(task, { name: 'computeTile' }),
    summarise: (task) => pool.run(task, { name: 'summarise' }),
    computeSlice: (task) => pool.run(task, { name: 'computeSlice' }),
    answerStudy: (task) => pool.run(task, { name: 'answerStudy' }),
    close: () => pool.destroy(),
  };
}
