import type { DexterityMap as MapAnswer } from '@/lib/contracts/maps';
import type { Arm, MapGrid, MapRequest } from '@/lib/kinematics/types';

/** The work of a map as it is handed to a thread: plain data in, plain data out, no database. */
export interface TileTask {
  readonly arm: Arm;
  readonly request: MapRequest;
  readonly rowFrom: number;
  readonly rowTo: number;
}

/** `fault` where the kernel refuses the question: why, in its own words. It would refuse it again. */
export type TileResult = { readonly bytes: Uint8Array } | { readonly fault: string };

export interface SummaryTask {
  readonly grid: MapGrid;
  /** All tiles of the map in order, encoded. */
  readonly tiles: readonly Uint8Array[];
}
export type MapSummary = NonNullable<MapAnswer['summary']>;

/** Where the work is done; rejects where the place itself breaks down, and then another try may help. */
export interface MapComputer {
  computeTile(task: TileTask): Promise<TileResult>;
  summarise(task: SummaryTask): Promise<MapSummary>;
}
