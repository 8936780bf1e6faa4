import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '../library';
import { readSpot } from '../spot';
import type { Arm } from '../types';
import { computeMapTile } from './compute-tile';

const armOf = (slug: string) => BUILT_IN_ARMS.find((arm) => arm.slug === slug)!.arm;
const STRAIGHT = { xyz: [0, 0, 0.1], rpy: [0, 0, 0] } as const;
const CROOKED = { xyz: [0.08, 0.02, 0.1], rpy: [0.2, 0.3, 0] } as const;

/**
 * Map and plumb look through the endless postures of a redundant arm apart from each other: the map for one best of all, the plumb for one of
 * each class. Largest difference of the inverse condition number allowed: by one search where the roll is fixed or does not matter, and by
 * two, one inside the other, where it has to be searched as well (measured over these spots: 0.0002 and 0.001).
 */
const ONE_SEARCH = 0.001;
const TWO_SEARCHES = 0.005;

describe.each([
  ['track-six-axis-30kg', [-1.7, -1.6], 0.9],
  ['seven-axis-9kg', [-0.6, -0.55], 0.23],
] as const)('map and plumb of %s', (slug, origin, step) => {
  it.each([
    ['straight tool, roll fixed', STRAIGHT, 0, 5, ONE_SEARCH],
    ['straight tool, roll free', STRAIGHT, 'free', 5, ONE_SEARCH],
    ['crooked tool, roll fixed', CROOKED, 0, 5, ONE_SEARCH],
    ['crooked tool, roll free', CROOKED, 'free', 3, TWO_SEARCHES],
  ] as const)('agree: %s', { timeout: 60_000 }, (_, tool, roll, side, within) => {
    const arm: Arm = { ...armOf(slug), tool };
    const tile = computeMapTile(
      arm,
      {
        grid: { origin, step, columns: side, rows: side },
        toolHeight: 0.4,
        direction: { kind: 'down' },
        roll,
        wrist: 'held',
        branch: 'best',
      },
      0,
      side,
    );
    let reached = 0;
    for (let cell = 0; cell < side * side; cell++) {
      const x = origin[0] + (cell % side) * step;
      const y = origin[1] + Math.floor(cell / side) * step;
      const spot = readSpot(arm, { position: [x, y, 0.4], direction: [0, 0, -1], roll }, 'held');
      expect(tile.reason[cell] === 0, `${x} ${y}`).toBe(spot.reached);
      if (!spot.reached) continue;
      reached++;
      const difference = tile.inverseConditionNumber[cell] - spot.postures[0].wristHeld.inverseConditionNumber!;
      expect(Math.abs(difference), `${x} ${y}`).toBeLessThan(within);
    }
    expect(reached).toBeGreaterThan(side);
  });
});
