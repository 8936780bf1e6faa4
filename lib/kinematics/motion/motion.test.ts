import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '../library';
import { makeGauge } from '../measures/gauge';
import { makeSolver } from '../solver';
import { identityTransform, rotationDistance, transformOf, type Transform } from '../transforms';
import type { Arm } from '../types';
import { seededRandom } from '../testing/random';
import { reach } from '../reach';
import { poseOf } from '../transforms';
import { cheapestWay } from './branch-choice';
import { branchOf, makeFollower } from './follow';
import { timePath } from './path-time';
import { straightPoses, turnBetween } from './poses';
import { jointMove, restToRestTime } from './profile';

const DEG = Math.PI / 180;
const armOf = (slug: string): Arm => BUILT_IN_ARMS.find((arm) => arm.slug === slug)!.arm;

/** Two links of 0.5 and 0.4 m, 180 and 300 °/s: the planar arm of the check values in KINEMATICS.md. */
const planar: Arm = {
  convention: 'standard',
  freedoms: ['x', 'y'],
  joints: [
    [0.5, 180 * DEG],
    [0.4, 300 * DEG],
  ].map(([a, maxSpeed]) => ({
    type: 'revolute',
    a,
    alpha: 0,
    d: 0,
    theta: 0,
    min: -Math.PI,
    max: Math.PI,
    maxSpeed,
    maxAcceleration: 600 * DEG,
  })),
};

const sledge: Arm = {
  convention: 'standard',
  joints: [{ type: 'prismatic', a: 0, alpha: 0, d: 0, theta: 0, min: 0, max: 4, maxSpeed: 1.5, maxAcceleration: 3 }],
  freedoms: ['z'],
};

describe('a move from rest to rest', () => {
  // The two check values of KINEMATICS.md; by hand: 90/180 + 180/600 = 0.8, and 2 √(30/600) = 0.447214.
  it('takes d/v + v/a where it comes to its speed, and 2 √(d/a) where it does not', () => {
    expect(restToRestTime(90 * DEG, 180 * DEG, 600 * DEG)).toBeCloseTo(0.8, 12);
    expect(restToRestTime(30 * DEG, 180 * DEG, 600 * DEG)).toBeCloseTo(0.447214, 6);
    expect(restToRestTime(-90 * DEG, 180 * DEG, 600 * DEG)).toBeCloseTo(0.8, 12);
    expect(restToRestTime(0, 180, 600)).toBe(0);
  });

  it('is one move where trapezoid and triangle meet, at d = v²/a', () => {
    const [v, a] = [180, 600];
    expect(restToRestTime((v * v) / a, v, a)).toBeCloseTo((2 * v) / a, 12);
  });

  it('of several joints lasts as long as the slowest', () => {
    const chain = makeSolver(planar).chain;
    // Joint 1: 90° in 0.8 s. Joint 2: 90° at 300 °/s and 600 °/s² is a triangle, 2 √(90/600) = 0.774597 s.
    const move = jointMove(chain, [0, 0], [90 * DEG, 90 * DEG]);
    expect(move.seconds).toBeCloseTo(0.8, 12);
    expect(move.slowest).toBe(0);
    expect(jointMove(chain, [0, 0], [0, 90 * DEG])).toMatchObject({ slowest: 1 });
    expect(jointMove(chain, [0, 0], [0, 90 * DEG]).seconds).toBeCloseTo(0.774597, 6);
    expect(jointMove(chain, [1, 1], [1, 1])).toEqual({ seconds: 0, slowest: -1 });
  });
});

describe('a run along a path', () => {
  const samples = (steps: number, lengthM: number) =>
    Array.from({ length: steps + 1 }, (_, k) => ({ atM: (k * lengthM) / steps, posture: [(k * lengthM) / steps] }));

  it.each([1, 2, 7, 100])(
    'of one sliding joint takes as long as the joint from rest to rest, in %i intervals',
    (steps) => {
      const { chain } = makeSolver(sledge);
      for (const length of [0.3, 2])
        expect(timePath(chain, samples(steps, length), Infinity).seconds).toBeCloseTo(
          restToRestTime(length, 1.5, 3),
          9,
        );
    },
  );

  it('goes no faster than it is told', () => {
    const { chain } = makeSolver(sledge);
    const slow = timePath(chain, samples(400, 2), 0.5);
    expect(Math.max(...slow.gone)).toBeLessThanOrEqual(0.5);
    expect(slow.seconds).toBeCloseTo(restToRestTime(2, 0.5, 3), 9);
  });

  it.each([
    // Speed along the path of the planar arm at (0°, 60°): 1.295571 along +X and 1.570796 along +Y (KINEMATICS.md).
    [0, 1.295571],
    [1, 1.570796],
  ])('is capped by the speed along it, axis %i at %f m/s', (axis, expected) => {
    const solver = makeSolver(planar);
    const middle = solver.stand([0, 60 * DEG]) && Float64Array.from(solver.stance.tool);
    const at = (by: number): Transform => {
      const pose = middle.slice();
      pose[axis === 0 ? 3 : 7] += by;
      return pose;
    };
    const shifts = [-0.002, -0.001, 0, 0.001, 0.002];
    const follow = makeFollower(planar, solver);
    // The chain turns the tool as it goes; only the point is followed, as its freedoms say.
    const { postures, stop } = follow([0, 60 * DEG], shifts.map(at));
    expect(stop).toBeNull();
    const timed = timePath(
      solver.chain,
      postures.map((posture, k) => ({ atM: k * 0.001, posture })),
      Infinity,
    );
    // Differences of samples 1 mm apart take the steeper side, so they stay a little below.
    expect(timed.allowed[2]).toBeLessThanOrEqual(expected);
    expect(timed.allowed[2]).toBeGreaterThan(expected * 0.99);
  });

  it('is nowhere faster than the velocity polytope allows', () => {
    const arm = armOf('six-axis-12kg');
    const solver = makeSolver(arm);
    const gauge = makeGauge(solver.chain, solver.freedoms, 'held');
    const from = transformOf({ xyz: [0.8, -0.4, 0.5], rpy: [Math.PI, 0, 0] });
    const to = transformOf({ xyz: [0.8, 0.4, 0.5], rpy: [Math.PI, 0, 0] });
    const { poses, atM } = straightPoses(from, to, 0.005, 0);
    const start = reach(solver, { pose: poseOf(from) }).postures[0].posture;
    const { postures, stop } = makeFollower(arm, solver)(start, poses);
    expect(stop).toBeNull();
    const timed = timePath(
      solver.chain,
      postures.map((posture, k) => ({ atM: atM[k], posture })),
      Infinity,
    );
    postures.slice(1, -1).forEach((posture, index) => {
      gauge.read(solver.stand(posture));
      expect(timed.allowed[index + 1]).toBeLessThan(gauge.speedAlong([0, 1, 0]) * 1.02);
      expect(timed.gone[index + 1]).toBeLessThanOrEqual(timed.allowed[index + 1]);
    });
    // Seen from outside, by differences of the timed postures: no joint goes faster than it can.
    for (let k = 1; k < postures.length; k++)
      postures[k].forEach((value, i) => {
        const speed = Math.abs(value - postures[k - 1][i]) / (timed.at[k] - timed.at[k - 1]);
        expect(speed).toBeLessThanOrEqual(solver.chain.maxSpeed[i] * (1 + 1e-9));
      });
  });
});

describe('following', () => {
  it('keeps to the poses and to the branch that it starts in', () => {
    const arm = armOf('six-axis-12kg');
    const solver = makeSolver(arm);
    const from = transformOf({ xyz: [0.7, -0.3, 0.4], rpy: [Math.PI, 0.2, 0] });
    const to = transformOf({ xyz: [0.9, 0.3, 0.6], rpy: [Math.PI, 0, 0.4] });
    const { poses } = straightPoses(from, to, 0.01, rotationDistance(from, to));
    for (const { posture, branch } of reach(solver, { pose: poseOf(from) }).postures) {
      const { postures, stop } = makeFollower(arm, solver)(posture, poses);
      if (stop) continue;
      expect(branchOf(solver, posture)).toBe(branch);
      postures.forEach((values, k) => {
        solver.stand(values);
        expect(rotationDistance(solver.stance.tool, poses[k])).toBeLessThan(1e-6);
        expect(branchOf(solver, values)).toBe(branch);
      });
    }
  });

  it('stops where a joint comes to its limit, and names it', () => {
    const solver = makeSolver(sledge);
    const pose = (z: number) => transformOf({ xyz: [0, 0, z], rpy: [0, 0, 0] });
    const { postures, stop } = makeFollower(sledge, solver)([3.9], [3.9, 4, 4.1].map(pose));
    expect(postures).toHaveLength(2);
    expect(stop).toMatchObject({ reason: 'joint limit', joint: 0 });
    expect(stop!.by).toBeCloseTo(0.1, 6);
  });

  it('turns evenly, the shorter way', () => {
    const half = turnBetween(
      transformOf({ xyz: [0, 0, 0], rpy: [0, 0, -100 * DEG] }),
      transformOf({ xyz: [0, 0, 0], rpy: [0, 0, 100 * DEG] }),
      0.5,
      identityTransform(),
    );
    expect(rotationDistance(half, transformOf({ xyz: [0, 0, 0], rpy: [0, 0, Math.PI] }))).toBeLessThan(1e-9);
  });
});

describe('the choice of branches', () => {
  /** Tries every combination. */
  function exhaustive(
    sizes: number[],
    cost: (l: number, a: number, b: number) => number,
    close?: (l: number, f: number) => number,
  ) {
    let best = Infinity;
    const walk = (states: number[], spent: number): void => {
      if (states.length === sizes.length) {
        best = Math.min(best, spent + (close ? close(states[states.length - 1], states[0]) : 0));
        return;
      }
      for (let next = 0; next < sizes[states.length]; next++)
        walk([...states, next], spent + (states.length ? cost(states.length - 1, states[states.length - 1], next) : 0));
    };
    walk([], 0);
    return best;
  }

  it('costs what the best of all combinations costs', () => {
    const random = seededRandom(11);
    for (let trial = 0; trial < 40; trial++) {
      const sizes = Array.from({ length: 2 + Math.floor(random() * 4) }, () => 1 + Math.floor(random() * 4));
      const table = sizes.map((size, l) =>
        Array.from({ length: size }, () =>
          Array.from({ length: sizes[(l + 1) % sizes.length] }, () => (random() < 0.15 ? Infinity : random())),
        ),
      );
      const cost = (l: number, a: number, b: number) => table[l][a][b];
      const close = (last: number, first: number) => table[sizes.length - 1][last][first];
      expect(cheapestWay(sizes, cost)?.cost ?? Infinity).toBeCloseTo(exhaustive(sizes, cost), 12);
      const round = cheapestWay(sizes, cost, close);
      expect(round?.cost ?? Infinity).toBeCloseTo(exhaustive(sizes, cost, close), 12);
      if (!round) continue;
      // What it says it takes is what it costs.
      const spent = round.states.reduce(
        (sum, state, l) => sum + table[l][state][round.states[(l + 1) % sizes.length]],
        0,
      );
      expect(spent).toBeCloseTo(round.cost, 12);
    }
  });

  it('is none where a layer is empty or no way goes through', () => {
    expect(cheapestWay([2, 0], () => 1)).toBeNull();
    expect(cheapestWay([1, 1], () => Infinity)).toBeNull();
  });
});
