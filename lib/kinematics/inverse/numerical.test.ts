import { describe, expect, it } from 'vitest';
import { withinLimits } from '../limits';
import { reach } from '../reach';
import { makeSolver, type Solver } from '../solver';
import { planar, RIGHT_ANGLE, sliding, turning } from '../testing/chains';
import { randomPosture, seededRandom } from '../testing/random';
import { missOf, poser } from '../testing/round-trip';
import type { Arm } from '../types';

const seven: Arm = {
  convention: 'standard',
  joints: [-1, 1, 1, -1, -1, 1, 0].map((quarter, i) =>
    turning({ a: 0, alpha: quarter * RIGHT_ANGLE, d: [0.34, 0, 0.4, 0, 0.4, 0, 0.12][i] }),
  ),
  tool: { xyz: [0.06, 0.03, 0.12], rpy: [0.5, -0.4, 0.3] },
};
/** No three wrist axes meet, so there is no closed form for it here. */
const offsetWrist: Arm = {
  convention: 'standard',
  joints: [
    turning({ a: 0, alpha: RIGHT_ANGLE, d: 0.15 }),
    turning({ a: -0.43, alpha: 0, d: 0 }),
    turning({ a: -0.39, alpha: 0, d: 0 }),
    turning({ a: 0, alpha: RIGHT_ANGLE, d: 0.13 }),
    turning({ a: 0, alpha: -RIGHT_ANGLE, d: 0.1 }),
    turning({ a: 0, alpha: 0, d: 0.1 }),
  ],
};
const gantry: Arm = {
  convention: 'standard',
  joints: [
    sliding({ a: 0, alpha: RIGHT_ANGLE, d: 0 }),
    { ...sliding({ a: 0, alpha: RIGHT_ANGLE, d: 0 }), theta: RIGHT_ANGLE },
    sliding({ a: 0, alpha: 0, d: 0.2 }),
  ],
};
const coupled: Arm = {
  convention: 'standard',
  joints: planar([0.5, 0.4, 0.2]),
  coupling: [
    [1, 0],
    [0, 1],
    [-1, -1],
  ],
  actuators: [1.8, 1.7].map((maxSpeed) => ({ min: -2, max: 2, maxSpeed, maxAcceleration: 5 })),
};

/** The solver without its closed form, where it has one: what other chains have to make do with. */
const iterating = (arm: Arm): Solver => ({ ...makeSolver(arm), closedForm: null, method: 'numerical' });

describe('damped least squares', () => {
  it('is the way of chains that no closed form knows', () => {
    for (const arm of [offsetWrist, gantry, coupled]) expect(makeSolver(arm).method).toBe('numerical');
  });

  it.each([
    ['seven axes', seven, 60],
    ['six axes with an offset wrist', offsetWrist, 60],
    ['gantry', gantry, 30],
    ['coupled planar arm', coupled, 60],
  ])('%s: reaches poses that it can make, to 1e-9 and inside the limits', (_, arm, count) => {
    const solver = iterating(arm);
    const stand = poser(arm);
    const random = seededRandom(6);
    let reached = 0;
    for (let i = 0; i < count; i++) {
      let made = randomPosture(solver.chain, random);
      // Under a coupling the actuators may stand well and a joint that they drive not.
      while (!withinLimits(solver.chain, made)) made = randomPosture(solver.chain, random);
      const pose = stand(made);
      const answer = reach(solver, { pose });
      if (answer.reached) reached++;
      for (const { posture } of answer.postures) {
        expect(missOf(stand(posture), pose)).toBeLessThan(1e-9);
        expect(withinLimits(solver.chain, posture)).toBe(true);
      }
    }
    // Several starts, not a proof: what it owes is nearly all of them.
    expect(reached / count).toBeGreaterThanOrEqual(0.95);
  });

  it('answers the same twice', () => {
    const pose = poser(seven)([0.3, 0.5, -0.4, 1.1, 0.2, 0.7, -0.6]);
    expect(reach(iterating(seven), { pose })).toEqual(reach(iterating(seven), { pose }));
  });

  it('lets a free roll be what it likes', () => {
    const stand = poser(seven);
    const position = [0.45, 0.1, 0.3] as const;
    const answer = reach(iterating(seven), { position, direction: [0, 0, -1], roll: 'free' });
    expect(answer.reached).toBe(true);
    for (const { posture } of answer.postures) {
      const pose = stand(posture);
      expect(Math.hypot(...position.map((value, row) => pose[row][3] - value))).toBeLessThan(1e-9);
      expect(Math.hypot(pose[0][2], pose[1][2], pose[2][2] + 1)).toBeLessThan(1e-9);
    }
  });

  it.each([
    ['too far', [1.5, 0, 0.34], 1.5 - (0.4 + 0.4 + 0.12)],
    ['too far', [0, 0, 2], 2 - (0.34 + 0.4 + 0.4 + 0.12)],
  ] as const)('says that a spot is %s and by how much', (reason, [x, y, z], by) => {
    const straight: Arm = { ...seven, tool: undefined };
    const answer = reach(iterating(straight), { position: [x, y, z], direction: [x, y, z - 0.34], roll: 'free' });
    expect(answer).toMatchObject({ reached: false, reason });
    expect(answer.by).toBeCloseTo(by, 4);
  });

  it('tells a joint limit from a spot out of reach', () => {
    const stiff: Arm = {
      ...seven,
      tool: undefined,
      joints: seven.joints.map((joint, i) => (i === 3 ? { ...joint, min: -0.3, max: 0.3 } : joint)),
    };
    const answer = reach(iterating(stiff), { position: [0.3, 0, 0.3], direction: [0, 0, -1], roll: 'free' });
    expect(answer).toMatchObject({ reached: false, reason: 'joint limit', joint: 3 });
    expect(answer.by).toBeGreaterThan(0.5);
  });

  it('tells a direction that the chain cannot take', () => {
    expect(reach(iterating(gantry), { position: [0.5, -0.5, 0.5], direction: [1, 1, 1], roll: 0 }).reached).toBe(false);
  });
});
