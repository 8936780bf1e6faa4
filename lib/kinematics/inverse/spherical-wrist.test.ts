import { describe, expect, it } from 'vitest';
import { compileChain } from '../chain';
import { withinLimits } from '../limits';
import { BUILT_IN_ARMS } from '../library';
import { reach } from '../reach';
import { makeSolver } from '../solver';
import { DEGREE, RIGHT_ANGLE, turning } from '../testing/chains';
import { randomPosture, seededRandom } from '../testing/random';
import { missOf, poser, postureDistance } from '../testing/round-trip';
import type { Arm } from '../types';

const medium = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
const crooked: Pick<Arm, 'base' | 'tool'> = {
  base: { xyz: [0.3, -0.2, 0.5], rpy: [0.2, -0.3, 0.4] },
  tool: { xyz: [0.06, 0.03, 0.12], rpy: [0.5, -0.4, 0.3] },
};

/** Craig's rows, angle offsets, a lateral offset of the elbow, and joint 3 turning against joint 2. */
const odd: Arm = {
  convention: 'modified',
  joints: [
    turning({ a: 0, alpha: 0, d: 0.4 }, 2, 0.7),
    turning({ a: 0.1, alpha: -RIGHT_ANGLE, d: 0.07 }, 2, 0.3),
    turning({ a: 0.6, alpha: Math.PI, d: 0.02 }, 2, -0.4),
    turning({ a: 0.1, alpha: RIGHT_ANGLE, d: 0.5 }, 3, -0.2),
    turning({ a: 0, alpha: RIGHT_ANGLE, d: 0 }, 4, 0.25),
    turning({ a: 0, alpha: -RIGHT_ANGLE, d: 0.1 }, 5, 1),
  ],
};

/** Solves `count` random reachable poses; answers how far solutions miss at worst, and how many postures are not found again. */
function roundTrips(arm: Arm, count: number, seed: number) {
  const solver = makeSolver(arm);
  expect(solver.method).toBe('spherical wrist');
  const stand = poser(arm);
  const random = seededRandom(seed);
  let worst = 0;
  let lost = 0;
  let outside = 0;
  for (let i = 0; i < count; i++) {
    const posture = randomPosture(solver.chain, random);
    const pose = stand(posture);
    const answer = reach(solver, { pose });
    if (!answer.postures.some((found) => postureDistance(found.posture, posture) < 1e-7)) lost++;
    for (const found of answer.postures) {
      worst = Math.max(worst, missOf(stand(found.posture), pose));
      if (!withinLimits(solver.chain, found.posture)) outside++;
    }
  }
  return { worst, lost, outside };
}

describe('six axes with a spherical wrist', () => {
  it('finds the posture that made the pose among its solutions, and every solution makes the pose to 1e-9 (10,000 poses)', () => {
    const { worst, lost, outside } = roundTrips({ ...medium, ...crooked }, 10_000, 1);
    expect({ lost, outside }).toEqual({ lost: 0, outside: 0 });
    expect(worst).toBeLessThan(1e-9);
  });

  it.each([
    ...BUILT_IN_ARMS.filter(({ slug }) => slug.startsWith('six-axis')).map(({ name, arm }) => [name, arm] as const),
    ['odd rows', odd] as const,
    ['odd rows, crooked', { ...odd, ...crooked }] as const,
  ])('%s does so too (1,000 poses)', (_, arm) => {
    const { worst, lost, outside } = roundTrips(arm, 1000, 2);
    expect({ lost, outside }).toEqual({ lost: 0, outside: 0 });
    expect(worst).toBeLessThan(1e-9);
  });

  it('counts an aligned wrist once a shoulder and elbow, joint 4 pinned', () => {
    const arm: Arm = { ...medium, joints: medium.joints.map((joint) => ({ ...joint, min: -3.1, max: 3.1 })) };
    const stand = poser(arm);
    const pose = stand([0.3, -0.9, 0.2, 0.5, 0, 0.4]);
    const { postures } = reach(makeSolver(arm), { pose });
    const aligned = postures.filter(({ posture }) => Math.abs(posture[4]) < 1e-9);
    expect(aligned).toHaveLength(1);
    expect(aligned[0].posture[3]).toBe(0);
    expect(aligned[0].posture[5]).toBeCloseTo(0.9, 9);
    for (const { posture } of postures) expect(missOf(stand(posture), pose)).toBeLessThan(1e-9);
  });

  it('stays exact where the wrist is nearly aligned', () => {
    const stand = poser(medium);
    const solver = makeSolver(medium);
    for (let exponent = 1; exponent <= 16; exponent++) {
      const pose = stand([0.3, -0.9, 0.2, 0.5, 10 ** -exponent, 0.4]);
      const { postures } = reach(solver, { pose });
      expect(postures.length, `1e-${exponent}`).toBeGreaterThan(0);
      for (const { posture } of postures) expect(missOf(stand(posture), pose)).toBeLessThan(1e-9);
    }
  });

  it('puts joint 1 at zero where the wrist centre lies on its axis', () => {
    const { shoulderOffset, down } = { shoulderOffset: medium.joints[0].a, down: medium.joints[5].d };
    expect(shoulderOffset).toBeGreaterThan(0);
    const pose = [
      [1, 0, 0, 0],
      [0, -1, 0, 0],
      [0, 0, -1, 1.2 - down],
      [0, 0, 0, 1],
    ];
    const wide: Arm = { ...medium, joints: medium.joints.map((joint) => ({ ...joint, min: -6.2, max: 6.2 })) };
    const stand = poser(wide);
    const { reached, postures } = reach(makeSolver(wide), { pose });
    expect(reached).toBe(true);
    for (const { posture } of postures) {
      expect(Math.abs(Math.sin(posture[0]))).toBeLessThan(1e-12);
      expect(missOf(stand(posture), pose)).toBeLessThan(1e-9);
    }
  });

  it('reaches the stretched elbow in spite of rounding', () => {
    const stand = poser(medium);
    const solver = makeSolver(medium);
    // Upper arm and forearm in one line: joint 3 at −90° less the angle that the elbow offset makes.
    const stretched = -RIGHT_ANGLE + Math.atan2(medium.joints[2].a, medium.joints[3].d);
    const random = seededRandom(4);
    for (let i = 0; i < 200; i++) {
      const posture = [2 * random() - 1, -1.2 * random(), stretched, random(), 0.3 + random(), random()];
      const pose = stand(posture);
      const { postures } = reach(solver, { pose });
      expect(postures.length, posture.join(' ')).toBeGreaterThan(0);
      for (const found of postures) expect(missOf(stand(found.posture), pose)).toBeLessThan(1e-9);
    }
  });

  it('gives every whole-turn copy inside the limits, and no other', () => {
    const posture = [0.3, -0.9, 0.2, 0.5, 0.6, -1];
    const { postures } = reach(makeSolver(medium), { pose: poser(medium)(posture) });
    const same = postures.filter((found) => postureDistance(found.posture.slice(0, 5), posture.slice(0, 5)) < 1e-9);
    expect(same.map((found) => found.posture[5]).sort((a, b) => a - b)).toEqual([
      expect.closeTo(-1, 9),
      expect.closeTo(2 * Math.PI - 1, 9),
    ]);
    expect(medium.joints[5].max).toBeCloseTo(360 * DEGREE, 9);
    for (const found of postures) expect(withinLimits(compileChain(medium), found.posture)).toBe(true);
  });

  it('names its classes: a reach over the shoulder, a bent-down elbow, a flipped wrist', () => {
    const wide: Arm = { ...medium, joints: medium.joints.map((joint) => ({ ...joint, min: -3.1, max: 3.1 })) };
    const pose = poser(wide)([0.2, -1, 0.3, 0.4, 0.7, 0.2]);
    const { postures } = reach(makeSolver(wide), { pose });
    const branchOf = (test: (posture: number[]) => boolean) => postures.filter((found) => test(found.posture));
    for (const { branch } of branchOf((posture) => Math.abs(posture[0] - 0.2) < 1e-6))
      expect(branch).toMatch(/^shoulder right/);
    for (const { branch } of branchOf((posture) => Math.abs(posture[0] - 0.2) > 1))
      expect(branch).toMatch(/^shoulder left/);
    expect(new Set(postures.map(({ branch }) => branch)).size).toBe(postures.length);
  });
});
