import { mapWorkPerSpot } from '@/lib/kinematics/maps/work';
import type { Arm, MapGrid, MapRequest } from '@/lib/kinematics/types';

/** How a map is cut into jobs. Work is counted in plain spots: one closed-form solution each, some 50 µs. */

/** About a third of a second: little to lose when a worker dies, and long beside what the queue costs. */
const WORK_PER_TILE = 6000;
/** Beyond a million spots a map's picture could not show more. */
const SPOT_LIMIT = 1_000_000;
/** About 25 minutes of one core. */
const WORK_LIMIT = 30_000_000;
const SECONDS_PER_WORK = 50e-6;

interface Question {
  readonly arm: Arm;
  readonly request: MapRequest;
}

const workPerSpot = ({ arm, request }: Question): number => mapWorkPerSpot(arm, request);

/** Spots that a map of this arm may have. */
export function spotLimitOf(question: Question): number {
  return Math.min(SPOT_LIMIT, Math.floor(WORK_LIMIT / workPerSpot(question)));
}

export function tileCountOf(question: Question): number {
  const { rows, columns } = question.request.grid;
  const rowsPerTile = Math.max(1, Math.floor(WORK_PER_TILE / (columns * workPerSpot(question))));
  return Math.ceil(rows / rowsPerTile);
}

/** Seconds that a tile takes at most on an idle core; tiles are whole rows, so one of a slow arm may take long. */
export function secondsPerTile(question: Question): number {
  const { rows, columns } = question.request.grid;
  return Math.ceil(rows / tileCountOf(question)) * columns * workPerSpot(question) * SECONDS_PER_WORK;
}

/**
 * The rows rowFrom … rowTo − 1 of a tile. Follows from the stored count alone, so that a worker of another version cuts
 * the map at the same rows.
 */
export function rowsOfTile(
  grid: MapGrid,
  tileCount: number,
  index: number,
): { readonly rowFrom: number; readonly rowTo: number } {
  const start = (tile: number): number => Math.floor((tile * grid.rows) / tileCount);
  return { rowFrom: start(index), rowTo: start(index + 1) };
}
