import { computeMapTile } from '@/lib/kinematics/maps/compute-tile';
import { mapSummary } from '@/lib/kinematics/maps/summary';
import { decodeMapTile, encodeMapTile } from '@/lib/kinematics/maps/tile-codec';
import type { MapSummary, SummaryTask, TileResult, TileTask } from './computer';

/** The work itself, as a thread does it; pure, so that it gives the same bytes wherever it runs. */

export function computeTile({ arm, request, rowFrom, rowTo }: TileTask): TileResult {
  try {
    return { bytes: encodeMapTile(computeMapTile(arm, request, rowFrom, rowTo)) };
  } catch (error) {
    if (!(error instanceof Error)) throw error;
    return { fault: error.message };
  }
}

export function summarise({ grid, tiles }: SummaryTask): MapSummary {
  return mapSummary(
    tiles.map((bytes) => decodeMapTile(bytes)),
    grid.step,
  );
}
