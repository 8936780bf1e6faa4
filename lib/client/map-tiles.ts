import type { DexterityMap } from '@/lib/contracts/maps';
import { decodeMapTile } from '@/lib/kinematics/maps/tile-codec';
import type { MapTile } from '@/lib/kinematics/types';
import { problemFrom, unreachable, unreadable } from './problem-error';

/** Splits the answer of a tiles route: the tiles one behind another, each with its length before it. */
export function splitTiles(bytes: ArrayBuffer): MapTile[] {
  const view = new DataView(bytes);
  const tiles: MapTile[] = [];
  let at = 0;
  while (at + 4 <= bytes.byteLength) {
    const length = view.getUint32(at, true);
    at += 4;
    if (at + length > bytes.byteLength) throw unreadable();
    tiles.push(decodeMapTile(new Uint8Array(bytes, at, length)));
    at += length;
  }
  if (at !== bytes.byteLength) throw unreadable();
  return tiles;
}

const FIELDS = [
  'reason',
  'bindingJoint',
  'branch',
  'inverseConditionNumber',
  'maximumToolSpeed',
  'sureSpeed',
  'limitShare',
  'wristCoverage',
] as const satisfies readonly (keyof MapTile)[];

/** One tile of all rows. Throws ProblemError `unreadable` where rows are missing. */
export function joinTiles(tiles: readonly MapTile[], columns: number, rows: number): MapTile {
  const cells = columns * rows;
  const whole: MapTile = {
    rowFrom: 0,
    rowTo: rows,
    columns,
    reason: new Uint8Array(cells),
    bindingJoint: new Uint8Array(cells),
    branch: new Uint8Array(cells),
    inverseConditionNumber: new Float32Array(cells),
    maximumToolSpeed: new Float32Array(cells),
    sureSpeed: new Float32Array(cells),
    limitShare: new Float32Array(cells),
    wristCoverage: new Float32Array(cells),
  };
  let joined = 0;
  for (const tile of tiles) {
    if (tile.columns !== columns || tile.rowTo > rows) throw unreadable();
    for (const field of FIELDS) whole[field].set(tile[field], tile.rowFrom * columns);
    joined += tile.rowTo - tile.rowFrom;
  }
  if (joined !== rows) throw unreadable();
  return whole;
}

/** Fetches a finished map from an address that answers its tiles. Throws ProblemError. */
export async function fetchTilesFrom(url: string, grid: DexterityMap['grid']): Promise<MapTile> {
  let response: Response;
  try {
    response = await fetch(url, { credentials: 'same-origin' });
  } catch {
    throw unreachable();
  }
  if (!response.ok) throw problemFrom(response.status, await response.json().catch(() => null));
  return joinTiles(splitTiles(await response.arrayBuffer()), grid.columns, grid.rows);
}

export function fetchMapTile(map: DexterityMap): Promise<MapTile> {
  return fetchTilesFrom(`/api/maps/${encodeURIComponent(map.id)}/tiles`, map.grid);
}
