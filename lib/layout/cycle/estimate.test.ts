import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { reach } from '@/lib/kinematics/reach';
import { makeSolver } from '@/lib/kinematics/solver';
import { seededRandom } from '@/lib/kinematics/testing/random';
import type { Arm } from '@/lib/kinematics/types';
import { fixtureSchema, robotSchema, type Fixture, type Robot } from '../items';
import { estimateCycles, type CycleEstimate } from './estimate';

const armOf = (slug: string): Arm => BUILT_IN_ARMS.find((arm) => arm.slug === slug)!.arm;
const sixAxis = armOf('six-axis-12kg');
const id = (digit: number): string => `00000000-0000-4000-8000-${String(digit).padStart(12, '0')}`;

const robot = (sequence: object[], change: object = {}): Robot =>
  robotSchema.parse({
    kind: 'robot',
    id: id(1),
    name: 'R1',
    armId: id(2),
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    sequence,
    ...change,
  });

const tray = (change: object): Fixture =>
  fixtureSchema.parse({
    kind: 'fixture',
    id: id(3),
    name: 'Tray',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    outlineMm: [
      [0, 0],
      [1, 0],
      [0, 1],
    ],
    zToMm: 800,
    ...change,
  });

const at = (digit: number, change: object = {}) => ({
  kind: 'point',
  id: id(500 + digit),
  fixtureId: id(3),
  taskPointId: id(100 + digit),
  ...change,
});
const point = (digit: number, xMm: number, yMm: number, zMm: number, change: object = {}) => ({
  id: id(100 + digit),
  name: `P${digit}`,
  xMm,
  yMm,
  zMm,
  ...change,
});
const estimate = (arm: Arm, sequence: object[], work: object, change: object = {}): CycleEstimate =>
  estimateCycles([robot(sequence, change), tray(work)], () => arm)[0];

/** A trapezoid worked out here once more: d/v + v/a, or 2 √(d/a). */
const rest = (d: number, v: number, a: number): number => (d < (v * v) / a ? 2 * Math.sqrt(d / a) : d / v + v / a);

/** Three sliding axes along x, y and z, each with its own speed, tool straight down. */
const speeds = [1, 2, 0.5];
const bridge: Arm = {
  convention: 'modified',
  freedoms: ['x', 'y', 'z'],
  joints: [
    { a: 0, alpha: Math.PI / 2, theta: Math.PI / 2 },
    { a: 0, alpha: Math.PI / 2, theta: Math.PI / 2 },
    { a: 0, alpha: Math.PI / 2, theta: Math.PI / 2 },
  ].map((row, index) => ({
    type: 'prismatic' as const,
    ...row,
    d: 0,
    min: -3,
    max: 3,
    maxSpeed: speeds[index],
    maxAcceleration: 2,
  })),
};

describe('the cycle of a robot', () => {
  it('is the best of all combinations of branches, moves timed by hand', () => {
    const random = seededRandom(5);
    const { chain } = makeSolver(sixAxis);
    const solver = makeSolver(sixAxis);
    for (let trial = 0; trial < 4; trial++) {
      const points = [0, 1, 2].map((k) => {
        const angle = (random() - 0.5) * 3;
        const radius = 600 + 350 * random();
        return point(k, radius * Math.cos(angle), radius * Math.sin(angle), 400 + 300 * random(), { dwellS: 0.25 * k });
      });
      const states = points.map(({ xMm, yMm, zMm }) => {
        const answer = reach(solver, {
          position: [xMm / 1000, yMm / 1000, zMm / 1000],
          direction: [0, 0, -1],
          roll: 'free',
        });
        expect(answer.postures.length).toBeGreaterThan(1);
        return answer.postures.map(({ posture }) => posture);
      });
      const move = (a: number[], b: number[]): number =>
        Math.max(...a.map((value, i) => rest(Math.abs(value - b[i]), chain.maxSpeed[i], chain.maxAcceleration[i])));
      let least = Infinity;
      for (const a of states[0])
        for (const b of states[1])
          for (const c of states[2]) least = Math.min(least, move(a, b) + move(b, c) + move(c, a));
      const cycle = estimate(sixAxis, [at(0), at(1), at(2)], { taskPoints: points });
      expect(cycle.problems).toEqual([]);
      expect(cycle.totalS).toBeCloseTo(least + 0.75, 9);
    }
  });

  it('adds dwell, grip and handshake times, and compares with the target', () => {
    const work = { taskPoints: [point(0, 800, 0, 600, { dwellS: 1.5 })] };
    const wait = { kind: 'wait', id: id(600), cause: 'handshake', name: 'Press opens', seconds: 2 };
    const cycle = estimate(sixAxis, [at(0), wait], work, { targetCycleS: 4 });
    expect(cycle.totalS).toBeCloseTo(3.5, 12);
    expect(cycle.marginS).toBeCloseTo(0.5, 12);
    expect(cycle.steps.map(({ holdS }) => holdS)).toEqual([1.5, 2]);
  });

  it('names a point that is out of reach, and times the rest as if it were not there', () => {
    const points = [point(0, 800, -200, 600), point(1, 9000, 0, 600), point(2, 800, 200, 600)];
    const whole = estimate(sixAxis, [at(0), at(1), at(2)], { taskPoints: points });
    const rest = estimate(sixAxis, [at(0), at(2)], { taskPoints: points });
    expect(whole.problems).toHaveLength(1);
    expect(whole.problems[0]).toMatchObject({ number: 2, label: 'P1' });
    expect(whole.problems[0].message).toMatch(/^Out of reach by \d+ mm\. The step is left out\.$/);
    expect(whole.totalS).toBeCloseTo(rest.totalS, 12);
    expect(whole.totalS).toBeGreaterThan(0);
  });

  it('asks for what is missing, and says what is gone', () => {
    const pattern = { id: id(100), name: 'Pallet', xMm: 800, yMm: 0, zMm: 600, columns: 2 };
    const { problems, steps } = estimate(
      sixAxis,
      [
        at(0),
        at(0, { id: id(510), place: 3 }),
        at(0, { id: id(511), place: 2 }),
        at(7),
        { kind: 'zone', id: id(520), zoneId: id(9), action: 'enter' },
      ],
      { taskPatterns: [pattern] },
    );
    expect(problems.map(({ number, message }) => [number, message])).toEqual([
      [1, 'Which place of Pallet? Write 1 to 2 at the step.'],
      [2, 'Which place of Pallet? Write 1 to 2 at the step.'],
      [4, 'Its task point is gone from Tray. Remove the step.'],
      [5, 'Its zone is gone from the sheet. Choose another one, or remove the step.'],
    ]);
    expect(steps.map(({ label }) => label)).toEqual(['Pallet, place 2']);
  });
});

describe('a straight move', () => {
  it('of sliding axes takes as long as the axis that is shortest of speed, and comes to rest at every via point', () => {
    const solver = makeSolver(bridge);
    solver.stand([0, 0, 0]);
    const moved = (joint: number): number[] => {
      solver.stand([0, 1, 2].map((i) => (i === joint ? 1 : 0)));
      return [3, 7, 11].map((i) => solver.stance.tool[i]);
    };
    const zero = (solver.stand([0, 0, 0]), [3, 7, 11].map((i) => solver.stance.tool[i]));
    const direction = moved(0).map((value, i) => value - zero[i]);
    const z = [solver.stance.tool[2], solver.stance.tool[6], solver.stance.tool[10]];
    const aim = { tiltDeg: (Math.acos(-z[2]) * 180) / Math.PI, azimuthDeg: (Math.atan2(z[1], z[0]) * 180) / Math.PI };
    const points = [0, 1].map((k) =>
      point(k, 1000 * k * direction[0], 1000 * k * direction[1], 1000 * k * direction[2], aim),
    );
    const straight = estimate(bridge, [at(0, { motion: 'straight' }), at(1, { motion: 'straight' })], {
      taskPoints: points,
    });
    expect(straight.problems).toEqual([]);
    // 1 m of the first axis at 1 m/s and 2 m/s²: 1.5 s each way.
    const exact = rest(1, speeds[0], 2);
    straight.steps.forEach(({ moveS, motion, lengthMm }) => {
      expect(motion).toBe('straight');
      expect(lengthMm).toBeCloseTo(1000, 6);
      expect(moveS).toBeCloseTo(exact, 6);
    });
    const via = direction.map((value) => 500 * value);
    const stopped = estimate(bridge, [at(0, { motion: 'straight' }), at(1, { motion: 'straight', viaMm: [via] })], {
      taskPoints: points,
    });
    expect(stopped.steps[1].moveS).toBeCloseTo(2 * rest(0.5, speeds[0], 2), 6);
    expect(stopped.steps[1].moveS).toBeGreaterThan(straight.steps[1].moveS);
  });

  it('is never quicker than the joints could go there by themselves', () => {
    const points = [point(0, 700, -350, 500), point(1, 700, 350, 700)];
    const run = (motion: string) => estimate(sixAxis, [at(0, { motion }), at(1, { motion })], { taskPoints: points });
    const [joint, straight] = [run('joint'), run('straight')];
    expect(straight.problems).toEqual([]);
    expect(straight.totalS).toBeGreaterThanOrEqual(joint.totalS * 0.999);
  });

  it('reports where it passes close to a singular posture, with the joint that races', () => {
    const planar: Arm = {
      convention: 'standard',
      freedoms: ['x', 'y'],
      joints: [0.5, 0.4].map((a) => ({
        type: 'revolute',
        a,
        alpha: 0,
        d: 0,
        theta: 0,
        min: -3,
        max: 3,
        maxSpeed: 3,
        maxAcceleration: 10,
      })),
    };
    // Stretched, this arm reaches 900 mm; the way passes 899.9 mm from its axis.
    const points = [
      point(0, 20, 899.9, 0, { tiltDeg: 180 }),
      point(1, -300, 700, 0, { tiltDeg: 180 }),
      point(2, -9, 899.9, 0, { tiltDeg: 180 }),
    ];
    const cycle = estimate(planar, [at(1), at(2), at(0, { motion: 'straight' })], {
      taskPoints: points.map((each, k) => (k === 0 ? { ...each, xMm: 9 } : each)),
    });
    const [, , last] = cycle.steps;
    expect(last.crossings.length).toBeGreaterThan(0);
    expect(last.crossings[0].joint).not.toBeNull();
    expect(last.crossings[0].speedMmS).toBeGreaterThan(0);
  });

  it('that cannot be kept is named, and timed as a joint move', () => {
    // Straight through the middle of the arm.
    const points = [point(0, 700, 0, 500), point(1, -700, 0, 500)];
    const cycle = estimate(sixAxis, [at(0), at(1, { motion: 'straight' })], { taskPoints: points });
    expect(cycle.problems[0]).toMatchObject({ number: 2, label: 'P1' });
    expect(cycle.problems[0].message).toMatch(
      /straight way cannot be kept: .* mm along\. Timed as a joint move instead\./,
    );
    expect(cycle.steps.map(({ motion }) => motion)).toEqual(['joint', 'joint']);
  });
});

describe('a path in a cycle', () => {
  it('is run at the wanted speed where the joints allow it: length over speed, and the ramps', () => {
    const path = {
      id: id(200),
      name: 'Seam',
      points: [
        { xMm: 800, yMm: -200, zMm: 600 },
        { xMm: 800, yMm: 200, zMm: 600 },
      ],
      speedMmS: 20,
    };
    const cycle = estimate(sixAxis, [{ kind: 'path', id: id(700), fixtureId: id(3), taskPathId: id(200) }], {
      taskPaths: [path],
    });
    expect(cycle.problems).toEqual([]);
    expect(cycle.steps[0].lengthMm).toBeCloseTo(400, 6);
    expect(cycle.steps[0].runS).toBeGreaterThanOrEqual(400 / 20);
    expect(cycle.steps[0].runS).toBeLessThan(400 / 20 + 0.05);
    // And back to its start: one robot, one step, and a move.
    expect(cycle.steps[0].moveS).toBeGreaterThan(0);
  });
});
