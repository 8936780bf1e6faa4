import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { computeMapTile } from '@/lib/kinematics/maps/compute-tile';
import { readSpot } from '@/lib/kinematics/spot';
import { heightsOf, shownHeights, worstOfStack } from './map-stack';

const { arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!;
const HEIGHTS = [0.1, 0.5, 0.9];
const tileAt = (toolHeight: number) =>
  computeMapTile(
    arm,
    {
      grid: { origin: [-1.4, -1.4], step: 0.2, columns: 15, rows: 15 },
      toolHeight,
      direction: { kind: 'down' },
      roll: 'free',
      wrist: 'held',
      branch: 'best',
    },
    0,
    15,
  );

describe('a stack of maps', () => {
  it('is reached where each height is, with the least of what the spots say one by one', () => {
    const worst = worstOfStack(HEIGHTS.map(tileAt));
    let reached = 0;
    for (let cell = 0; cell < 225; cell += 1) {
      const [x, y] = [-1.4 + (cell % 15) * 0.2, -1.4 + Math.floor(cell / 15) * 0.2];
      const spots = HEIGHTS.map((z) =>
        readSpot(arm, { position: [x, y, z], direction: [0, 0, -1], roll: 'free' }, 'held'),
      );
      expect(worst.reason[cell] === 0).toBe(spots.every((spot) => spot.reached));
      if (worst.reason[cell] !== 0) {
        expect(worst.inverseConditionNumber[cell]).toBeNaN();
        continue;
      }
      reached += 1;
      const least = Math.min(...spots.map(({ postures }) => postures[0].wristHeld.inverseConditionNumber!));
      expect(worst.inverseConditionNumber[cell]).toBeCloseTo(least, 6);
    }
    expect(reached).toBeGreaterThan(20);
  });

  it('names its heights once each, and the shown one where it is not among them', () => {
    expect(heightsOf({ stackMm: [900, 600, 900], toolHeightMm: 700 })).toEqual([600, 700, 900]);
    expect(shownHeights({ stackMm: [900, 600], toolHeightMm: 700, stackShown: 'worst' })).toEqual([600, 900]);
    expect(shownHeights({ stackMm: [900, 600], toolHeightMm: 700, stackShown: 'height' })).toEqual([700]);
    expect(shownHeights({ stackMm: [], toolHeightMm: 700, stackShown: 'worst' })).toEqual([700]);
  });

  it('refuses maps that do not lie on one another', () => {
    const narrow = { ...tileAt(0.5), columns: 9 };
    expect(() => worstOfStack([tileAt(0.1), narrow])).toThrow(RangeError);
    expect(() => worstOfStack([])).toThrow(RangeError);
  });
});
