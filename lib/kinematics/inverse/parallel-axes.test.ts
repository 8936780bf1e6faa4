import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '../library';
import { reach } from '../reach';
import { makeSolver } from '../solver';
import { planar, sliding, turning } from '../testing/chains';
import { randomPosture, seededRandom } from '../testing/random';
import { missOf, poser, postureDistance } from '../testing/round-trip';
import type { Arm } from '../types';

const scara = BUILT_IN_ARMS.find(({ slug }) => slug === 'scara-5kg')!.arm;
const turned: Pick<Arm, 'base' | 'tool'> = {
  base: { xyz: [0.3, -0.2, 0.5], rpy: [0.2, -0.3, 0.4] },
  tool: { xyz: [0.06, 0.03, 0.12], rpy: [0.1, 0, 0.3] },
};
const pointing = (x: number, y: number, z: number, direction: [number, number, number] = [0, 0, -1]) => ({
  position: [x, y, z] as const,
  direction,
  roll: 0,
});

describe('arms with parallel axes', () => {
  it.each([
    ['SCARA', scara],
    ['SCARA, tilted base, crooked tool', { ...scara, ...turned }],
    [
      'quill first, Craig’s rows',
      {
        convention: 'modified',
        joints: [
          sliding({ a: 0, alpha: 0, d: 0.2 }),
          turning({ a: 0.1, alpha: 0, d: 0.1 }, 2, 0.4),
          turning({ a: 0.35, alpha: Math.PI, d: 0.03 }, 2, -0.3),
          turning({ a: 0.25, alpha: 0, d: 0.05 }),
        ],
      } satisfies Arm,
    ],
    ['planar, three turns', { convention: 'standard', joints: planar([0.5, 0.4, 0.1]) } satisfies Arm],
    ['planar, two turns', { convention: 'standard', joints: planar([0.5, 0.4]) } satisfies Arm],
  ])('%s: the posture is among the solutions, which make the pose to 1e-9 (2,000 poses)', (_, arm) => {
    const solver = makeSolver(arm);
    expect(solver.method).toBe('parallel axes');
    const stand = poser(arm);
    const random = seededRandom(5);
    let worst = 0;
    for (let i = 0; i < 2000; i++) {
      const posture = randomPosture(solver.chain, random);
      const pose = stand(posture);
      const { postures } = reach(solver, { pose });
      expect(postures.some((found) => postureDistance(found.posture, posture) < 1e-7)).toBe(true);
      // Two turns alone take the orientation as it comes, so only the point is theirs to hit.
      for (const found of postures) {
        const miss = missOf(stand(found.posture), pose);
        const point = Math.hypot(...[0, 1, 2].map((row) => stand(found.posture)[row][3] - pose[row][3]));
        worst = Math.max(worst, solver.chain.joints === 2 ? point : miss);
      }
    }
    expect(worst).toBeLessThan(1e-9);
  });

  it('says why a spot is out: too far, too near, quill at its end, tool not upright', () => {
    const solver = makeSolver(scara);
    const [inner, outer] = [scara.joints[0].a, scara.joints[1].a];
    const level = scara.joints[0].d - 0.1;
    const far = reach(solver, pointing(inner + outer + 0.05, 0, level));
    expect(far).toMatchObject({ reached: false, reason: 'too far', joint: -1 });
    expect(far.by).toBeCloseTo(0.05, 9);
    const near = reach(solver, pointing(inner - outer - 0.02, 0, level));
    expect(near).toMatchObject({ reached: false, reason: 'too near' });
    expect(near.by).toBeCloseTo(0.02, 9);
    const low = reach(solver, pointing(0.4, 0.1, scara.joints[0].d - scara.joints[2].max - 0.03));
    expect(low).toMatchObject({ reached: false, reason: 'joint limit', joint: 2 });
    expect(low.by).toBeCloseTo(0.03, 9);
    expect(reach(solver, pointing(0.4, 0.1, level, [0, 0.1, -1]))).toMatchObject({
      reached: false,
      reason: 'direction',
    });
    expect(reach(solver, pointing(0.4, 0.1, level, [0, 0, 1]))).toMatchObject({ reached: false, reason: 'direction' });
  });
});
