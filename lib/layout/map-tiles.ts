import { decodeMapTile, makeMapTile } from '@/lib/kinematics/maps/tile-codec';
import type { MapTile } from '@/lib/kinematics/types';

/**
 * A whole map out of what GET /api/maps/[mapId]/tiles answers: tiles one behind another, each as a 4-byte little-endian
 * length and its bytes.
 * @throws RangeError where the bytes are cut short or the tiles do not join.
 */
export function readMapTiles(bytes: Uint8Array): MapTile {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const tiles: MapTile[] = [];
  for (let at = 0; at < bytes.length;) {
    if (at + 4 > bytes.length) throw new RangeError('A map is cut short.');
    const length = view.getUint32(at, true);
    at += 4;
    if (at + length > bytes.length) throw new RangeError('A map is cut short.');
    tiles.push(decodeMapTile(bytes.subarray(at, at + length)));
    at += length;
  }
  return joinTiles(tiles);
}

const PLANES = [
  'reason',
  'bindingJoint',
  'branch',
  'inverseConditionNumber',
  'maximumToolSpeed',
  'sureSpeed',
  'limitShare',
  'wristCoverage',
] as const;

/**
 * One tile out of neighbours in order.
 * @throws RangeError where one is missing or of another width.
 */
export function joinTiles(tiles: readonly MapTile[]): MapTile {
  if (tiles.length === 0) throw new RangeError('A map has no tiles.');
  const { rowFrom, columns } = tiles[0];
  const whole = makeMapTile(rowFrom, tiles[tiles.length - 1].rowTo, columns);
  let row = rowFrom;
  for (const tile of tiles) {
    if (tile.rowFrom !== row || tile.columns !== columns) throw new RangeError('The tiles of a map do not join.');
    for (const plane of PLANES) whole[plane].set(tile[plane], (row - rowFrom) * columns);
    row = tile.rowTo;
  }
  return whole;
}
