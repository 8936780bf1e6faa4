import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { makeMapComputer } from '@/lib/kinematics/maps/compute-tile';
import { mapOf } from './maps';

/** A worker process of two-workers.ts: computes the rows it is told to and says so. */

const SIDE = 1000;
const ROWS: Record<string, readonly [number, number]> = {
  whole: [0, SIDE],
  first: [0, SIDE / 2],
  second: [SIDE / 2, SIDE],
};
const { arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!;
const computer = makeMapComputer(arm, mapOf(arm, SIDE, 'held', 0), 'full grid');

process.on('message', (part: string) => {
  computer.tile(...ROWS[part]);
  process.send!('done');
});
process.send!('ready');
