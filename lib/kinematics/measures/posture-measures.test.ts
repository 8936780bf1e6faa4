import { describe, expect, it } from 'vitest';
import { compileChain, forward, jacobian, makeStance } from '../chain';
import { controlledFreedoms } from '../freedoms';
import { BUILT_IN_ARMS } from '../library';
import { makeSolver } from '../solver';
import { DEGREE, planar, RIGHT_ANGLE, turning } from '../testing/chains';
import { randomPosture, seededRandom } from '../testing/random';
import type { Arm, Vec3, WristMode } from '../types';
import { errorGain, worstErrorAlong } from './error-gain';
import { makeGauge } from './gauge';
import { makePoseConditioner } from './pose-condition';
import { principalDirections } from './principal-directions';
import { spreadDirections, wristCoverage } from './wrist-coverage';

const jacobianOf = (arm: Arm, posture: readonly number[]): Float64Array => {
  const chain = compileChain(arm);
  return jacobian(chain, forward(chain, posture, makeStance(chain)), new Float64Array(6 * chain.actuators));
};
const freedomsOf = (arm: Arm) => controlledFreedoms(arm, compileChain(arm));
const builtIn = (slug: string): Arm => BUILT_IN_ARMS.find((entry) => entry.slug === slug)!.arm;

/** Six axes without offsets: a ball of radius upper + fore for the wrist centre, about a shoulder 0.4 m up. */
const ballArm = (tool: number): Arm => ({
  convention: 'standard',
  joints: [
    [0, -1, 0.4],
    [0.5, 0, 0],
    [0, -1, 0],
    [0, 1, 0.5],
    [0, -1, 0],
    [0, 0, 0],
  ].map(([a, quarter, d], i) => ({
    ...turning({ a, alpha: quarter * RIGHT_ANGLE, d }, 1 + i),
    min: -2 * Math.PI,
    max: 2 * Math.PI,
  })),
  tool: { xyz: [0, 0, tool], rpy: [0, 0, 0] },
});

describe('pose condition', () => {
  // Planar arm on an equilateral triangle of side 1, tool at its centroid (Angeles).
  const arm: Arm = { convention: 'standard', joints: planar([1, 1, 1 / Math.sqrt(3)]) };
  const posture = [0, 120 * DEGREE, 150 * DEGREE];
  const condition = makePoseConditioner(compileChain(arm), freedomsOf(arm));

  it('of the triangle arm is 1 with the length 0.408248, its best, and 2.449490 with the length 1 (Angeles)', () => {
    const matrix = jacobianOf(arm, posture);
    expect(1 / condition(matrix, Math.sqrt(1 / 6)).inverseConditionNumber).toBeCloseTo(1, 12);
    expect(1 / condition(matrix, 0.408248).inverseConditionNumber).toBeCloseTo(1, 5);
    expect(1 / condition(matrix, 1).inverseConditionNumber).toBeCloseTo(2.44949, 6);
    const best = condition(matrix);
    expect(best.lengthM).toBeCloseTo(0.408248, 6);
    expect(best.inverseConditionNumber).toBeCloseTo(1, 9);
  });

  it.each(BUILT_IN_ARMS.map(({ name, arm: each }) => [name, each] as const))(
    '%s: no length beats the best one',
    (_, each) => {
      const chain = compileChain(each);
      const conditioner = makePoseConditioner(chain, freedomsOf(each));
      const random = seededRandom(31);
      for (let i = 0; i < 5; i++) {
        const matrix = jacobianOf(each, randomPosture(chain, random));
        const best = conditioner(matrix);
        for (let k = -12; k <= 12; k++)
          expect(conditioner(matrix, 10 ** (k / 6)).inverseConditionNumber).toBeLessThanOrEqual(
            best.inverseConditionNumber + 1e-9,
          );
      }
    },
  );

  it('refuses a length that is none', () => {
    const matrix = jacobianOf(arm, posture);
    for (const length of [0, -1, NaN, Infinity]) expect(() => condition(matrix, length)).toThrow(RangeError);
  });
});

describe('error gain', () => {
  const arm: Arm = { convention: 'standard', joints: planar([0.5, 0.4]) };
  const matrix = jacobianOf(arm, [0, 60 * DEGREE]);
  const error = 1 / 60 / 57.29577951308232;

  it('of a planar arm is what its Jacobian says by hand', () => {
    // Columns (−0.346410, 0.7) and (−0.346410, 0.2).
    const { shift, turn } = errorGain(matrix, [error, error]);
    expect(shift.worstByAxis.map((value) => value / error)).toEqual([
      expect.closeTo(0.69282, 6),
      expect.closeTo(0.9, 12),
      0,
    ]);
    expect(shift.worst / error).toBeCloseTo(Math.hypot(0.6928203, 0.9), 6);
    expect(shift.rootSumSquareByAxis[1] / error).toBeCloseTo(Math.hypot(0.7, 0.2), 12);
    // Its larger singular value (Yoshikawa's planar arm; see the check values of the published tests).
    expect(shift.rootSumSquare / error).toBeCloseTo(0.85372, 6);
    expect(turn.worst / error).toBeCloseTo(2, 12);
    expect(worstErrorAlong(matrix, [error, error], [0, 3, 0])).toBeCloseTo(shift.worstByAxis[1], 15);
  });

  it('bounds what forward kinematics does with random joint errors, and is met by the worst of them', () => {
    const six = builtIn('six-axis-12kg');
    const chain = compileChain(six);
    const stance = makeStance(chain);
    const random = seededRandom(32);
    const posture = randomPosture(chain, random);
    const at = (q: readonly number[]) => {
      const { tool } = forward(chain, q, stance);
      return [tool[3], tool[7], tool[11]];
    };
    const size = 1e-6;
    const { shift } = errorGain(
      jacobianOf(six, posture),
      posture.map(() => size),
    );
    const home = at(posture);
    let most = 0;
    for (let i = 0; i < 2000; i++) {
      const off = at(posture.map((q) => q + (random() < 0.5 ? size : -size)));
      const miss = off.map((value, row) => value - home[row]);
      most = Math.max(most, Math.hypot(...miss));
      miss.forEach((value, row) => expect(Math.abs(value)).toBeLessThan(shift.worstByAxis[row] * (1 + 1e-4)));
    }
    expect(most / shift.worst).toBeCloseTo(1, 4);
  });
});

describe('wrist coverage', () => {
  // (1 − c) / 2 with c = clip((ρ² + t² − R²) / (2 ρ t)): the cap of directions that leave the wrist centre within its ball (derivable).
  it.each([
    [1.1, 0.3],
    [0.9, 0.3],
    [0.5, 0.3],
    [1.4, 0.3],
    [1.02, 0.1],
  ])('of a ball-shaped arm at %f m, tool %f m, is its closed form', (away, tool) => {
    const c = Math.min(1, Math.max(-1, (away * away + tool * tool - 1) / (2 * away * tool)));
    const solver = makeSolver(ballArm(tool));
    const out: Vec3 = [0.6, 0, 0.8];
    const position: Vec3 = [0.6 * away, 0, 0.4 + 0.8 * away];
    const { share, directions, reached } = wristCoverage(solver, position, { kind: 'sphere' }, 800);
    expect(Math.abs(share - (1 - c) / 2)).toBeLessThan(0.005);
    directions.forEach((direction, i) => {
      const cosine = direction[0] * out[0] + direction[2] * out[2];
      if (Math.abs(cosine - c) > 1e-6) expect(reached[i]).toBe(cosine > c ? 1 : 0);
    });
    if (c <= -1 || c >= 1) return;
    const half = Math.acos(c);
    const cone = (axis: Vec3, halfAngle: number) =>
      wristCoverage(solver, position, { kind: 'cone', axis, halfAngle }, 60).share;
    expect(cone(out, half - 1e-6)).toBe(1);
    expect(cone([-0.6, 0, -0.8], Math.PI - half - 1e-6)).toBe(0);
  });

  it('spreads its directions evenly: every cap holds its share', () => {
    const directions = spreadDirections({ kind: 'sphere' }, 2000);
    for (const [x, y, z] of spreadDirections({ kind: 'cone', axis: [1, 2, -3], halfAngle: 3 }, 40)) {
      const inCap = directions.filter((d) => d[0] * x + d[1] * y + d[2] * z > 0.4).length;
      expect(Math.abs(inCap / 2000 - 0.3)).toBeLessThan(0.01);
    }
    for (const direction of spreadDirections({ kind: 'cone', axis: [0, 0, -2], halfAngle: 0.5 }, 50)) {
      expect(Math.hypot(...direction)).toBeCloseTo(1, 12);
      expect(-direction[2]).toBeGreaterThan(Math.cos(0.5) - 1e-12);
    }
  });
});

describe('principal directions', () => {
  const expectSound = (arm: Arm, mode: WristMode, posture: readonly number[]) => {
    const chain = compileChain(arm);
    const freedoms = freedomsOf(arm);
    const matrix = jacobianOf(arm, posture);
    const n = chain.actuators;
    const { principal, still } = principalDirections(chain, freedoms, mode, matrix);
    const moved = (row: number, u: readonly number[]) =>
      u.reduce((sum, share, i) => sum + matrix[row * n + i] * chain.maxSpeed[i] * share, 0);
    for (const [i, { gain, tool, joints }] of principal.entries()) {
      for (const other of principal.slice(i))
        expect(tool.reduce((sum, value, row) => sum + value * other.tool[row], 0)).toBeCloseTo(
          other === principal[i] ? 1 : 0,
          9,
        );
      if (!joints) continue;
      expect(Math.hypot(...joints)).toBeCloseTo(1, 9);
      for (const row of freedoms)
        if (row < 3) expect(moved(row, joints)).toBeCloseTo(gain * tool[row], 9);
        else if (mode === 'held') expect(moved(row, joints)).toBeCloseTo(0, 9);
    }
    for (const motion of still)
      for (const row of freedoms) if (row < 3 || mode === 'held') expect(moved(row, motion)).toBeCloseTo(0, 9);
    return { principal, still };
  };

  it.each(BUILT_IN_ARMS.map(({ name, arm }) => [name, arm] as const))(
    '%s: joint speeds V make gains σ along U, and what is left over moves nothing',
    (_, arm) => {
      const chain = compileChain(arm);
      const random = seededRandom(33);
      for (let i = 0; i < 10; i++) {
        const posture = randomPosture(chain, random);
        const held = expectSound(arm, 'held', posture);
        expect(held.still).toHaveLength(chain.actuators - freedomsOf(arm).length);
        expect(expectSound(arm, 'free', posture).still).toHaveLength(chain.actuators - 3);
      }
    },
  );

  it('at an aligned wrist names the direction that is lost and the motion that does nothing', () => {
    const { principal, still } = expectSound(ballArm(0.1), 'held', [0.1, -1, 0.3, 0.4, 0, 0.2]);
    expect(principal[2].gain).toBeLessThan(1e-12);
    expect(principal[2].joints).toBeNull();
    expect(still).toHaveLength(1);
    // Only joints 4 and 6, against each other in rad/s: as shares of their limits of 4 and 6 rad/s.
    const [, , , fourth, , sixth] = still[0];
    expect(4 * fourth + 6 * sixth).toBeCloseTo(0, 9);
    expect(Math.hypot(fourth, sixth)).toBeCloseTo(1, 9);
  });
});

describe('speed along a direction of a flat set', () => {
  it('of a stretched planar arm is what both joints give across it, and nothing along it', () => {
    const arm: Arm = { convention: 'standard', joints: planar([0.5, 0.4], [2, 3]) };
    const gauge = makeGauge(compileChain(arm), freedomsOf(arm), 'free');
    expect(gauge.read(jacobianOf(arm, [0, 0])).sureSpeed).toBe(0);
    expect(gauge.speedAlong([0, 1])).toBeCloseTo(0.9 * 2 + 0.4 * 3, 12);
    expect(gauge.speedAlong([1, 0])).toBe(0);
    expect(gauge.speedAlong([1e-3, 1])).toBe(0);
  });

  it('at an aligned wrist is where the ray leaves the flat polygon', () => {
    const arm = ballArm(0.1);
    const chain = compileChain(arm);
    const posture = [0.1, -1, 0.3, 0.4, 0, 0.2];
    const matrix = jacobianOf(arm, posture);
    const gauge = makeGauge(chain, freedomsOf(arm), 'held');
    expect(gauge.read(matrix).sureSpeed).toBe(0);
    const { principal } = principalDirections(chain, freedomsOf(arm), 'held', matrix);
    const [u, v, lost] = principal.map(({ tool }) => tool);
    expect(gauge.speedAlong(lost)).toBe(0);
    const corners = gauge.corners();
    const points: [number, number][] = [];
    for (let c = 0; c < corners.length; c += 3) {
      const [x, y] = [u, v].map((axis) => axis.reduce((sum, value, row) => sum + value * corners[c + row], 0));
      points.push([x, y], [-x, -y]);
    }
    for (let angle = 0.05; angle < Math.PI; angle += 0.3) {
      const [dx, dy] = [Math.cos(angle), Math.sin(angle)];
      // Every line through two corners that all corners lie on one side of is an edge; the ray leaves by the nearest.
      let leaves = Infinity;
      for (const [ax, ay] of points)
        for (const [bx, by] of points) {
          const [nx, ny] = [by - ay, ax - bx];
          const size = Math.hypot(nx, ny);
          if (size < 1e-9) continue;
          const offset = (nx * ax + ny * ay) / size;
          if (points.some(([x, y]) => (nx * x + ny * y) / size > offset + 1e-9)) continue;
          const along = (nx * dx + ny * dy) / size;
          if (along > 1e-9) leaves = Math.min(leaves, offset / along);
        }
      const direction = u.map((value, row) => dx * value + dy * v[row]);
      expect(gauge.speedAlong(direction)).toBeCloseTo(leaves, 9);
    }
  });
});
