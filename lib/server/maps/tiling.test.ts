import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { MapRequest } from '@/lib/kinematics/types';
import { rowsOfTile, secondsPerTile, spotLimitOf, tileCountOf } from './tiling';

const { arm } = BUILT_IN_ARMS[0];
const bent = { ...arm, tool: { xyz: [0, 0, 0.1], rpy: [0, 0.5, 0] } } as const;

function request(columns: number, rows: number): MapRequest {
  const grid = { origin: [0, 0], step: 0.025, columns, rows } as const;
  return { grid, toolHeight: 0, direction: { kind: 'down' }, roll: 'free', wrist: 'held', branch: 'best' };
}

describe('cutting a map', () => {
  it('gives every row to one tile', () => {
    for (const [rows, tiles] of [
      [121, 3],
      [7, 7],
      [1000, 167],
      [1, 1],
    ]) {
      const { grid } = request(10, rows);
      const cuts = Array.from({ length: tiles }, (_, index) => rowsOfTile(grid, tiles, index));
      expect(cuts[0].rowFrom).toBe(0);
      expect(cuts[tiles - 1].rowTo).toBe(rows);
      cuts.forEach(({ rowFrom, rowTo }, index) => {
        expect(rowTo).toBeGreaterThan(rowFrom);
        if (index > 0) expect(rowFrom).toBe(cuts[index - 1].rowTo);
      });
    }
  });

  it('makes smaller tiles, and fewer spots, of work that takes longer', () => {
    const plain = { arm, request: request(121, 121) };
    const searched = { arm: bent, request: request(121, 121) };
    expect(tileCountOf(plain)).toBe(3);
    expect(tileCountOf(searched)).toBe(121);
    expect(secondsPerTile(searched)).toBeLessThan(1);
    expect(spotLimitOf(searched)).toBeLessThan(spotLimitOf(plain));
    // A fixed roll needs no search, whatever the tool.
    expect(tileCountOf({ arm: bent, request: { ...searched.request, roll: 0 } })).toBe(3);
  });
});
