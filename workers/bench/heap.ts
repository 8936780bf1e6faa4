import { PerformanceObserver } from 'node:perf_hooks';
import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { makeFullGrid } from '@/lib/kinematics/maps/full-grid';
import { makeSolver } from '@/lib/kinematics/solver';
import type { WristMode } from '@/lib/kinematics/types';
import { mapOf } from './maps';
import { table, title } from './print';

const SIDE = 1000;

/** Growth of the heap over a million poses, with the collections that fell into them: without one, growth is all that was allocated. */
export async function heapGrowth() {
  title('Heap growth over 1 000 000 poses of a map, cell by cell, planes aside');
  setFlagsFromString('--expose-gc');
  const collect = runInNewContext('gc') as () => void;
  const rows: string[][] = [];
  for (const slug of ['six-axis-12kg', 'scara-5kg'])
    for (const wrist of ['held', 'free'] as const) rows.push(await oneArm(slug, wrist, collect));
  table(['', 'heap grew by', 'collections meanwhile', 'after collecting'], rows);
}

async function oneArm(slug: string, wrist: WristMode, collect: () => void): Promise<string[]> {
  const { arm } = BUILT_IN_ARMS.find((entry) => entry.slug === slug)!;
  const grid = makeFullGrid(makeSolver(arm), mapOf(arm, SIDE, wrist, 0), -1, true);
  const passes = slug.startsWith('six') ? SIDE : 100;
  const sweep = (rows: number) => {
    grid.start();
    for (let row = 0; row < rows; row++) for (let column = 0; column < SIDE; column++) grid.judge(column, row);
  };
  sweep(passes);
  let collections = 0;
  const observer = new PerformanceObserver((list) => (collections += list.getEntries().length));
  collect();
  await new Promise((done) => setTimeout(done, 20));
  observer.observe({ entryTypes: ['gc'] });
  const before = process.memoryUsage().heapUsed;
  sweep(passes);
  const after = process.memoryUsage().heapUsed;
  await new Promise((done) => setTimeout(done, 20));
  observer.disconnect();
  collect();
  const collected = process.memoryUsage().heapUsed;
  const kilobytes = (bytes: number) => `${(bytes / 1024).toFixed(0)} kB`;
  return [
    `${slug}, wrist ${wrist}, ${passes * SIDE} poses`,
    kilobytes(after - before),
    `${collections}`,
    kilobytes(collected - before),
  ];
}
