import { describe, expect, it } from 'vitest';
import { seededRandom } from '../testing/random';
import { decodeMapTile, encodeMapTile, makeMapTile } from './tile-codec';

function someTile(rowFrom: number, rowTo: number, columns: number, seed: number) {
  const random = seededRandom(seed);
  const tile = makeMapTile(rowFrom, rowTo, columns);
  for (let i = 0; i < tile.reason.length; i++) {
    tile.reason[i] = Math.floor(7 * random());
    tile.bindingJoint[i] = Math.floor(13 * random());
    tile.branch[i] = Math.floor(8 * random());
    if (tile.reason[i] !== 0) continue;
    tile.inverseConditionNumber[i] = random();
    tile.maximumToolSpeed[i] = 10 * random();
    tile.sureSpeed[i] = random();
    tile.limitShare[i] = random() / 2;
  }
  return tile;
}

describe('tiles as bytes', () => {
  it.each([
    [0, 4, 7],
    [3, 8, 1],
    [5, 5, 9],
    [0, 1, 0],
  ])('come back as they were: rows %i to %i of %i', (rowFrom, rowTo, columns) => {
    const tile = someTile(rowFrom, rowTo, columns, 1);
    expect(decodeMapTile(encodeMapTile(tile))).toEqual(tile);
  });

  it('are read from the middle of a longer buffer, as a database or a stream hands them over', () => {
    const tile = someTile(0, 3, 3, 2);
    const bytes = encodeMapTile(tile);
    const longer = new Uint8Array(bytes.length + 9);
    longer.set(bytes, 5);
    expect(decodeMapTile(longer.subarray(5, 5 + bytes.length))).toEqual(tile);
  });

  it('are refused with a RangeError, and nothing else, where they are damaged', () => {
    const bytes = encodeMapTile(someTile(0, 4, 5, 3));
    const random = seededRandom(4);
    for (let length = 0; length < bytes.length; length += 3)
      expect(() => decodeMapTile(bytes.subarray(0, length))).toThrow(RangeError);
    let refused = 0;
    for (let i = 0; i < 3000; i++) {
      const damaged = bytes.slice();
      // Most of the damage goes to the header, where it could lead astray.
      const at = random() < 0.8 ? Math.floor(16 * random()) : Math.floor(damaged.length * random());
      damaged[at] = Math.floor(256 * random());
      try {
        const tile = decodeMapTile(damaged);
        expect(tile.reason).toHaveLength((tile.rowTo - tile.rowFrom) * tile.columns);
      } catch (error) {
        refused++;
        expect(error).toBeInstanceOf(RangeError);
      }
    }
    expect(refused).toBeGreaterThan(1000);
  });

  it('are refused where a cell has a reason that is not known', () => {
    const bytes = encodeMapTile(someTile(0, 1, 2, 6));
    bytes[16] = 7;
    expect(() => decodeMapTile(bytes)).toThrow('reason');
  });

  it('of a format of later days are refused by name', () => {
    const bytes = encodeMapTile(someTile(0, 1, 1, 5));
    bytes[0] = 9;
    expect(() => decodeMapTile(bytes)).toThrow('unknown format 9');
  });
});
