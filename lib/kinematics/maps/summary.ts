import type { MapTile } from '../types';

/** What a finished map says in numbers: areas in m², speeds in m/s. Quantiles at 0, 10, …, 100 % of the reached cells; empty when none is. */
export interface MapSummary {
  readonly reachedAreaM2: number;
  readonly bestInverseConditionNumber: number | null;
  readonly fastestToolSpeed: number | null;
  readonly quantiles: {
    readonly inverseConditionNumber: number[];
    readonly maximumToolSpeed: number[];
    readonly sureSpeed: number[];
  };
}

/** `step`: cell side (m). */
export function mapSummary(tiles: readonly MapTile[], step: number): MapSummary {
  let reached = 0;
  for (const tile of tiles) for (const reason of tile.reason) if (reason === 0) reached++;
  const icn = sorted(tiles, 'inverseConditionNumber', reached);
  const speed = sorted(tiles, 'maximumToolSpeed', reached);
  return {
    reachedAreaM2: reached * step * step,
    bestInverseConditionNumber: reached > 0 ? icn[reached - 1] : null,
    fastestToolSpeed: reached > 0 ? speed[reached - 1] : null,
    quantiles: {
      inverseConditionNumber: deciles(icn),
      maximumToolSpeed: deciles(speed),
      sureSpeed: deciles(sorted(tiles, 'sureSpeed', reached)),
    },
  };
}

type Plane = 'inverseConditionNumber' | 'maximumToolSpeed' | 'sureSpeed';

function sorted(tiles: readonly MapTile[], plane: Plane, reached: number): Float32Array {
  const values = new Float32Array(reached);
  let at = 0;
  for (const tile of tiles)
    for (let i = 0; i < tile.reason.length; i++) if (tile.reason[i] === 0) values[at++] = tile[plane][i];
  return values.sort();
}

function deciles(values: Float32Array): number[] {
  if (values.length === 0) return [];
  return Array.from({ length: 11 }, (_, k) => values[Math.round((k / 10) * (values.length - 1))]);
}
