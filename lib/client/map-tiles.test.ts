import { describe, expect, it } from 'vitest';
import { encodeMapTile, makeMapTile } from '@/lib/kinematics/maps/tile-codec';
import { joinTiles, splitTiles } from './map-tiles';

/** The answer of a tiles route: a 4-byte little-endian length before each tile (lib/contracts/maps). */
function answerOf(tiles: Uint8Array[]): ArrayBuffer {
  const bytes: number[] = [];
  for (const tile of tiles) {
    const length = new Uint8Array(4);
    new DataView(length.buffer).setUint32(0, tile.length, true);
    bytes.push(...length, ...tile);
  }
  return Uint8Array.from(bytes).buffer;
}

function tile(rowFrom: number, rowTo: number) {
  const made = makeMapTile(rowFrom, rowTo, 3);
  made.inverseConditionNumber.forEach((_, cell) => (made.inverseConditionNumber[cell] = rowFrom * 3 + cell));
  made.reason.fill(rowFrom);
  return made;
}

describe('tiles of a map', () => {
  it('are put together in any order', () => {
    const answer = answerOf([tile(2, 3), tile(0, 2)].map(encodeMapTile));
    const whole = joinTiles(splitTiles(answer), 3, 3);
    expect([...whole.inverseConditionNumber]).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8]);
    expect([...whole.reason]).toEqual([0, 0, 0, 0, 0, 0, 2, 2, 2]);
  });

  it('are refused where some are missing or cut short', () => {
    expect(() => joinTiles([tile(0, 2)], 3, 3)).toThrow(/could not be read/);
    expect(() => joinTiles([tile(0, 3)], 4, 3)).toThrow(/could not be read/);
    expect(() => splitTiles(answerOf([encodeMapTile(tile(0, 2))]).slice(0, -5))).toThrow(/could not be read/);
  });
});
