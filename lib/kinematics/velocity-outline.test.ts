import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from './library';
import { analysePosture } from './posture';
import { planar, DEGREE } from './testing/chains';
import { randomPosture, seededRandom } from './testing/random';
import { compileChain } from './chain';
import { velocityOutlines } from './velocity-outline';
import type { Arm } from './types';

describe('outlines of the velocity set', () => {
  it('of a planar arm are its parallelogram and its ellipse (corners and gains worked out by hand)', () => {
    const arm: Arm = { convention: 'standard', joints: planar([0.5, 0.4], [180 * DEGREE, 300 * DEGREE]) };
    const { floor, upright } = velocityOutlines(arm, [0, 60 * DEGREE], 'free', 0);
    const corners = floor.polygon.map(([x, y]) => [x.toFixed(6), y.toFixed(6)].join(' ')).sort();
    expect(corners).toEqual(
      ['-2.902079 3.246312', '2.902079 -3.246312', '0.725520 1.151917', '-0.725520 -1.151917'].sort(),
    );
    expect(floor.ellipse.major).toBeCloseTo(3.091543, 6);
    expect(floor.ellipse.minor).toBeCloseTo(0.921582, 6);
    // The arm does not lift, so the upright outline is flat.
    expect(upright.polygon.every(([, height]) => Math.abs(height) < 1e-12)).toBe(true);
    expect(upright.ellipse.minor).toBeCloseTo(0, 12);
  });

  it.each(['held', 'free'] as const)('hold the sure speed and stay inside the maximum, wrist %s', (wrist) => {
    const arm = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
    const chain = compileChain(arm);
    const random = seededRandom(9);
    for (let i = 0; i < 50; i++) {
      const posture = randomPosture(chain, random);
      const whole = analysePosture(arm, posture);
      const measures = wrist === 'held' ? whole.wristHeld : whole.wristFree;
      const { floor, upright } = velocityOutlines(arm, posture, wrist, 6 * random());
      for (const { polygon, ellipse } of [floor, upright]) {
        expect(ellipse.major).toBeLessThanOrEqual(measures.ellipsoidSpeed! * (1 + 1e-9));
        polygon.forEach(([x, y], k) => {
          expect(Math.hypot(x, y)).toBeLessThanOrEqual(measures.maximumToolSpeed! * (1 + 1e-9));
          const [nextX, nextY] = polygon[(k + 1) % polygon.length];
          // Distance of the edge from the centre, positive for a polygon that runs counter-clockwise round it.
          const distance = (x * nextY - y * nextX) / Math.hypot(nextX - x, nextY - y);
          expect(distance).toBeGreaterThanOrEqual(measures.sureSpeed! * (1 - 1e-9) - 1e-12);
        });
      }
    }
  });
});
