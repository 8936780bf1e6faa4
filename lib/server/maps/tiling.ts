import type { MapGrid } from '@/lib/kinematics/types';

/** About a second of work: short enough to lose when a worker dies, long enough to outweigh the queue. */
const SPOTS_PER_TILE = 4000;

/** A map costs minutes of every worker beyond this, and its picture could not show more. */
export const SPOT_LIMIT = 1_000_000;

function rowsPerTile(grid: MapGrid): number {
  return Math.max(1, Math.round(SPOTS_PER_TILE / grid.columns));
}

export function tileCountOf(grid: MapGrid): number {
  return Math.ceil(grid.rows / rowsPerTile(grid));
}

/** The rows rowFrom … rowTo − 1 of a tile. */
export function rowsOfTile(grid: MapGrid, index: number): { readonly rowFrom: number; readonly rowTo: number } {
  const rowFrom = index * rowsPerTile(grid);
  return { rowFrom, rowTo: Math.min(grid.rows, rowFrom + rowsPerTile(grid)) };
}
