import { describe, expect, it } from 'vitest';
import { compileChain } from './chain';
import { computeMapTile } from './maps/compute-tile';
import { makePostureAnalyser } from './posture';
import { reach } from './reach';
import { makeSolver } from './solver';
import { readSpot } from './spot';
import { randomPosture, seededRandom } from './testing/random';
import type { Arm, Joint, Measures } from './types';
import { velocityOutlines } from './velocity-outline';

/**
 * Chains that nobody would build: zero lengths, coinciding and parallel axes, one joint or nine, couplings of low rank. Whatever is
 * asked of them, the answers are numbers (or null where a measure does not exist), and nothing is thrown.
 */

const pickFrom = <T>(random: () => number, list: readonly T[]): T => list[Math.floor(random() * list.length)];

function oddJoint(random: () => number): Joint {
  const length = () => pickFrom(random, [0, 0, 0.3, -0.4, 1e-12, random()]);
  const angle = () => pickFrom(random, [0, Math.PI / 2, -Math.PI / 2, Math.PI, 1e-10, 6 * random() - 3]);
  const min = -3 * random() - 0.01;
  return {
    type: random() < 0.25 ? 'prismatic' : 'revolute',
    a: length(),
    alpha: angle(),
    d: length(),
    theta: angle(),
    min,
    max: min + pickFrom(random, [1e-6, 1, 6, 13]),
    maxSpeed: pickFrom(random, [1e-6, 1, 2 + random(), 1000]),
    maxAcceleration: 1,
  };
}

function oddArm(random: () => number): Arm {
  const joints = Array.from({ length: 1 + Math.floor(9 * random()) }, () => oddJoint(random));
  const frame = () => ({
    xyz: [random(), random() - 0.5, random()] as const,
    rpy: [random(), 3 * random(), random()] as const,
  });
  const actuators = 1 + Math.floor(joints.length * random());
  const coupled = random() < 0.2;
  return {
    convention: random() < 0.5 ? 'standard' : 'modified',
    joints,
    base: random() < 0.5 ? frame() : undefined,
    tool: random() < 0.5 ? frame() : undefined,
    freedoms:
      random() < 0.2 ? pickFrom(random, [['x', 'y'], ['z'], ['x', 'y', 'z', 'rz'], ['rx']] as const) : undefined,
    coupling: coupled
      ? joints.map(() => Array.from({ length: actuators }, () => pickFrom(random, [0, 0, 1, -1, random()])))
      : undefined,
    actuators: coupled ? joints.slice(0, actuators) : undefined,
  };
}

function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  if (value === null || typeof value !== 'object') return [];
  return Object.values(value).flatMap(numbersIn);
}

function expectSound(measures: Measures) {
  const { gains, inverseConditionNumber, maximumToolSpeed, sureSpeed, ellipsoidSpeed } = measures;
  if (!gains) return;
  expect(gains).toEqual([...gains].sort((a, b) => b - a));
  for (const value of gains) expect(value).toBeGreaterThanOrEqual(0);
  expect(inverseConditionNumber).toBeGreaterThanOrEqual(0);
  expect(inverseConditionNumber).toBeLessThanOrEqual(1);
  // The ball |u| ≤ 1 lies inside the cube |u_i| ≤ 1, so no axis of its image reaches farther than the cube's image.
  const slack = 1e-9 * (1 + ellipsoidSpeed!);
  expect(maximumToolSpeed).toBeGreaterThanOrEqual(ellipsoidSpeed! - slack);
  expect(sureSpeed).toBeLessThanOrEqual(maximumToolSpeed! + slack);
  expect(sureSpeed).toBeGreaterThanOrEqual(gains[gains.length - 1] - slack);
}

describe('odd chains', () => {
  it('measure to numbers in any posture, zeros and limits included (400 chains)', () => {
    const random = seededRandom(7);
    for (let i = 0; i < 400; i++) {
      const arm = oddArm(random);
      const chain = compileChain(arm);
      const analyse = makePostureAnalyser(arm);
      const postures = [
        Array.from(chain.min),
        Array.from(chain.min, () => 0),
        randomPosture(chain, random),
        randomPosture(chain, random).map((value) => value * 1e-9),
      ];
      for (const posture of postures) {
        const answer = analyse(posture);
        const bad = numbersIn(answer).filter((value) => !Number.isFinite(value));
        expect(bad, JSON.stringify({ arm, posture })).toEqual([]);
        expectSound(answer.wristFree);
        expectSound(answer.wristHeld);
      }
    }
  });

  it('answer targets, spots and maps (60 chains)', () => {
    const random = seededRandom(8);
    for (let i = 0; i < 60; i++) {
      const arm = oddArm(random);
      const solver = makeSolver(arm);
      const roll = random() < 0.5 ? 'free' : random();
      const direction = pickFrom(random, [[0, 0, -1] as const, [1, 0, 0] as const, [random(), random(), 0.1] as const]);
      const position = pickFrom(random, [[0, 0, 0] as const, [random(), random(), random()] as const]);
      const answer = reach(solver, { position, direction, roll });
      expect(Number.isFinite(answer.by), JSON.stringify({ arm, position, direction, roll })).toBe(true);
      expect(numbersIn(answer.postures).every(Number.isFinite)).toBe(true);
      expect(answer.reached).toBe(answer.postures.length > 0);
      if (!solver.freedoms.some((row) => row < 3)) continue;
      const wrist = random() < 0.5 ? 'held' : 'free';
      const spot = readSpot(arm, { position, direction, roll }, wrist);
      expect(numbersIn(spot).every(Number.isFinite)).toBe(true);
      for (const { posture } of spot.postures) {
        const outlines = velocityOutlines(arm, posture, wrist, random());
        expect(numbersIn(outlines).every(Number.isFinite)).toBe(true);
      }
      const tile = computeMapTile(
        arm,
        {
          grid: { origin: [0, 0], step: 0.5, columns: 2, rows: 1 },
          toolHeight: 0.2,
          direction: { kind: 'vector', vector: direction },
          roll,
          wrist,
          branch: 'best',
        },
        0,
        1,
      );
      tile.reason.forEach((reason, cell) => {
        const values = [tile.inverseConditionNumber, tile.maximumToolSpeed, tile.sureSpeed, tile.limitShare];
        for (const plane of values) expect(Number.isNaN(plane[cell])).toBe(reason !== 0);
      });
    }
  });
});
