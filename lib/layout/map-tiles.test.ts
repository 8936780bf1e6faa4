import { describe, expect, it } from 'vitest';
import { encodeMapTile, makeMapTile } from '@/lib/kinematics/maps/tile-codec';
import type { MapTile } from '@/lib/kinematics/types';
import { joinTiles, readMapTiles } from './map-tiles';

function tileOf(rowFrom: number, rowTo: number, columns = 3): MapTile {
  const tile = makeMapTile(rowFrom, rowTo, columns);
  tile.sureSpeed.forEach((_, cell) => (tile.sureSpeed[cell] = rowFrom * columns + cell));
  tile.branch.forEach((_, cell) => (tile.branch[cell] = rowFrom * columns + cell));
  return tile;
}

/** As the server sends them: each behind its length. */
function packed(tiles: readonly MapTile[]): Uint8Array {
  const parts = tiles.flatMap((tile) => {
    const bytes = encodeMapTile(tile);
    const length = Buffer.alloc(4);
    length.writeUInt32LE(bytes.length);
    return [length, bytes];
  });
  return new Uint8Array(Buffer.concat(parts));
}

describe('the tiles of a map', () => {
  it('join to one', () => {
    const whole = readMapTiles(packed([tileOf(0, 2), tileOf(2, 3), tileOf(3, 7)]));
    expect(whole).toEqual(tileOf(0, 7));
  });

  it('are refused where the answer is cut short', () => {
    const bytes = packed([tileOf(0, 2), tileOf(2, 3)]);
    for (const length of [bytes.length - 1, 3, 0]) {
      expect(() => readMapTiles(bytes.subarray(0, length))).toThrow(RangeError);
    }
  });

  it('are refused where one is missing or of another width', () => {
    expect(() => joinTiles([tileOf(0, 2), tileOf(3, 4)])).toThrow('do not join');
    expect(() => joinTiles([tileOf(0, 2), tileOf(2, 4, 5)])).toThrow('do not join');
  });
});
