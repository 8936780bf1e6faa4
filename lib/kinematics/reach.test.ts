import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from './library';
import { reach } from './reach';
import { makeSolver } from './solver';
import { DEGREE } from './testing/chains';
import { missOf, poser } from './testing/round-trip';
import { poseOf, identityTransform } from './transforms';
import { orient } from './target';
import type { Arm, Target, Vec3 } from './types';

const medium = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
const down = (x: number, y: number, z: number, roll: number | 'free' = 0): Target => ({
  position: [x, y, z],
  direction: [0, 0, -1],
  roll,
});
/** The tool's frame of a target, from its words in the contract. */
function poseAt(position: Vec3, direction: Vec3, roll: number) {
  const pose = orient(direction, roll, identityTransform());
  [pose[3], pose[7], pose[11]] = position;
  return poseOf(pose);
}

describe('targets', () => {
  it('straight down with roll 0 is the rows (1 0 0) (0 −1 0) (0 0 −1)', () => {
    // Adding zero drops the sign of −0.
    const rows = poseAt([0, 0, 0], [0, 0, -2], 0).map((row) => row.map((value) => value + 0));
    expect(rows.slice(0, 3)).toEqual([
      [1, 0, 0, 0],
      [0, -1, 0, 0],
      [0, 0, -1, 0],
    ]);
  });

  it('along the frame’s x axis roll 0 puts the tool’s x axis along y', () => {
    for (const sign of [1, -1]) {
      const rows = poseAt([0, 0, 0], [sign, 0, 0], 0);
      expect(rows.slice(0, 3).map((row) => row[0])).toEqual([expect.closeTo(0, 15), 1, expect.closeTo(0, 15)]);
      expect(rows[0][2]).toBe(sign);
    }
  });

  it('a roll turns counter-clockwise about the tool’s z axis', () => {
    const rows = poseAt([0, 0, 0], [0, 0, 1], 30 * DEGREE);
    expect(rows[0][0]).toBeCloseTo(Math.cos(30 * DEGREE), 14);
    expect(rows[1][0]).toBeCloseTo(Math.sin(30 * DEGREE), 14);
  });

  it('as a pose and as a point with direction and roll has the same answer', () => {
    const solver = makeSolver(medium);
    const worded = reach(solver, { position: [0.8, 0.2, 0.4], direction: [0.2, 0.1, -1], roll: 0.7 });
    const whole = reach(solver, { pose: poseAt([0.8, 0.2, 0.4], [0.2, 0.1, -1], 0.7) });
    expect(worded.postures.length).toBeGreaterThan(0);
    expect(worded).toEqual(whole);
  });
});

describe('why a spot is not reached', () => {
  const solver = makeSolver(medium);
  const [shoulder, upper, elbow] = medium.joints.map(({ a }) => a);
  const [column, , , forearm, , flange] = medium.joints.map(({ d }) => d);
  const wristReach = upper + Math.hypot(elbow, forearm);

  it('too far, by the distance from the outer sphere of the wrist centre', () => {
    const answer = reach(solver, down(shoulder + wristReach + 0.062, 0, column - flange));
    expect(answer).toMatchObject({ reached: false, reason: 'too far', joint: -1, postures: [] });
    expect(answer.by).toBeCloseTo(0.062, 12);
  });

  it('too near, by the distance from the inner one', () => {
    const short: Arm = {
      ...medium,
      joints: medium.joints.map((joint, i) => ({
        ...joint,
        a: i === 1 ? 0.7 : 0,
        d: i === 3 ? 0.3 : joint.d,
      })),
    };
    const answer = reach(makeSolver(short), down(0.37, 0, column - flange));
    expect(answer).toMatchObject({ reached: false, reason: 'too near', joint: -1 });
    expect(answer.by).toBeCloseTo(0.4 - 0.37, 12);
  });

  it('a joint limit, with the joint and what is missing', () => {
    const narrow: Arm = {
      ...medium,
      joints: medium.joints.map((joint, i) => (i === 0 ? { ...joint, min: -1, max: 1 } : joint)),
    };
    const at = 70 * DEGREE;
    const answer = reach(makeSolver(narrow), down(0.8 * Math.cos(at), 0.8 * Math.sin(at), 0.4));
    expect(answer).toMatchObject({ reached: false, reason: 'joint limit', joint: 0 });
    expect(answer.by).toBeCloseTo(at - 1, 9);
  });

  it('is found for every cell of a coarse grid, and never without a number', () => {
    for (let x = -2; x <= 2; x += 0.23)
      for (let y = -2; y <= 2; y += 0.23) {
        const answer = reach(solver, down(x, y, 0.3));
        expect(Number.isFinite(answer.by)).toBe(true);
        expect(answer.reached).toBe(answer.postures.length > 0);
        expect(answer.reached).toBe(answer.reason === 'reached');
        if (answer.reason === 'joint limit') expect(answer.joint).toBeGreaterThanOrEqual(0);
      }
  });
});

describe('a free roll', () => {
  it('reaches where roll 0 is beyond the last joint’s limits', () => {
    const stiff: Arm = {
      ...medium,
      joints: medium.joints.map((joint, i) => (i === 5 ? { ...joint, min: 0.2, max: 0.4 } : joint)),
    };
    const solver = makeSolver(stiff);
    const fixed = Array.from({ length: 12 }, (_, k) => reach(solver, down(0.9, 0.1, 0.4, (k * Math.PI) / 6)).reached);
    expect(fixed).toContain(false);
    const answer = reach(solver, down(0.9, 0.1, 0.4, 'free'));
    expect(answer.reached).toBe(true);
    const stand = poser(stiff);
    for (const { posture, roll } of answer.postures)
      expect(missOf(stand(posture), poseAt([0.9, 0.1, 0.4], [0, 0, -1], roll))).toBeLessThan(1e-9);
  });

  it('is searched where the tool stands off the last axis: far spots need it turned outward', () => {
    const offset: Arm = { ...medium, tool: { xyz: [0.15, 0, 0.1], rpy: [0, 0, 0] } };
    const solver = makeSolver(offset);
    const spot = [0, 1.5, 0.3] as const;
    expect(reach(solver, down(...spot, 0)).reached).toBe(false);
    const answer = reach(solver, down(...spot, 'free'));
    expect(answer.reached).toBe(true);
    const stand = poser(offset);
    for (const { posture, roll } of answer.postures)
      expect(missOf(stand(posture), poseAt(spot, [0, 0, -1], roll))).toBeLessThan(1e-9);
  });
});
