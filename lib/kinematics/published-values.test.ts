import { describe, expect, it } from 'vitest';
import { compileChain, forward, jacobian, makeStance } from './chain';
import { controlledFreedoms } from './freedoms';
import { makeGauge } from './measures/gauge';
import { nullSpace } from './measures/null-space';
import { singularValues } from './measures/singular-values';
import { analysePosture } from './posture';
import { DEGREE, planar, RIGHT_ANGLE, turning } from './testing/chains';
import { randomPosture, seededRandom } from './testing/random';
import type { Arm } from './types';

/** Values from the literature or worked out by hand; the source stands beside each. */

const twoLinks = (speeds?: number[]): Arm => ({ convention: 'standard', joints: planar([0.5, 0.4], speeds) });
const bent = [0, 60 * DEGREE];

function gaugeOf(arm: Arm, mode: 'free' | 'held', posture: number[]) {
  const chain = compileChain(arm);
  const gauge = makeGauge(chain, controlledFreedoms(arm, chain), mode);
  gauge.read(jacobian(chain, forward(chain, posture, makeStance(chain)), new Float64Array(6 * chain.actuators)));
  return gauge;
}

describe('planar arm of 0.5 and 0.4 m at (0°, 60°)', () => {
  it('has the singular values and manipulability worked out by hand: w = l1 l2 |sin q2| (Yoshikawa 1985)', () => {
    const { wristFree } = analysePosture(twoLinks(), bent);
    expect(wristFree.gains![0]).toBeCloseTo(0.85372, 6);
    expect(wristFree.gains![1]).toBeCloseTo(0.202883, 6);
    expect(wristFree.manipulability).toBeCloseTo(0.173205, 6);
    expect(wristFree.manipulability).toBeCloseTo(0.5 * 0.4 * Math.sin(60 * DEGREE), 14);
  });

  it('with 180 and 300 °/s has the gains, polytope and speeds worked out by hand from its four corners', () => {
    const arm = twoLinks([180 * DEGREE, 300 * DEGREE]);
    const { wristFree, wristHeld } = analysePosture(arm, bent);
    expect(wristHeld).toEqual(wristFree);
    expect(wristFree.gains![0]).toBeCloseTo(3.091543, 6);
    expect(wristFree.gains![1]).toBeCloseTo(0.921582, 6);
    expect(wristFree.maximumToolSpeed).toBeCloseTo(4.354378, 6);
    expect(wristFree.sureSpeed).toBeCloseTo(1.161166, 6);
    expect(wristFree.ellipsoidSpeed).toBe(wristFree.gains![0]);
    const gauge = gaugeOf(arm, 'free', bent);
    const corners = gauge.corners();
    expect([corners[0], corners[1]].map((value) => value * Math.sign(corners[0]))).toEqual([
      expect.closeTo(2.902079, 6),
      expect.closeTo(-3.246312, 6),
    ]);
    expect([corners[2], corners[3]].map((value) => value * Math.sign(corners[2]))).toEqual([
      expect.closeTo(0.72552, 6),
      expect.closeTo(1.151917, 6),
    ]);
    expect(gauge.speedAlong([1, 0])).toBeCloseTo(1.295571, 6);
    expect(gauge.speedAlong([0, 1])).toBeCloseTo(1.570796, 6);
  });
});

it('is isotropic at l1 = √2 l2 and q2 = ±135° (Salisbury & Craig 1982)', () => {
  const arm: Arm = { convention: 'standard', joints: planar([Math.SQRT2 * 0.3, 0.3]) };
  for (const elbow of [135, -135])
    expect(analysePosture(arm, [0.4, elbow * DEGREE]).wristFree.inverseConditionNumber).toBeCloseTo(1, 12);
});

describe('planar arm on an equilateral triangle of side 1, tool at its centroid (Angeles)', () => {
  const arm: Arm = { convention: 'standard', joints: planar([1, 1, 1 / Math.sqrt(3)]) };
  const posture = [0, 120 * DEGREE, 90 * DEGREE + 60 * DEGREE];

  function conditionWith(lengthM: number): number {
    const { jacobian: rows } = analysePosture(arm, posture);
    const weighted = Float64Array.from([...rows[5], ...rows[0], ...rows[1]], (value, i) =>
      i < 3 ? value : value / lengthM,
    );
    const values = new Float64Array(3);
    singularValues(weighted, 3, 3, values);
    return values[0] / values[2];
  }

  it('has its tool where the triangle’s centroid is', () => {
    const { pose } = analysePosture(arm, posture);
    expect([pose[0][3], pose[1][3]]).toEqual([expect.closeTo(0.5, 12), expect.closeTo(Math.sqrt(3) / 6, 12)]);
  });

  it('has condition 1 with the length 0.408248 and 2.449490 with the length 1', () => {
    expect(conditionWith(Math.sqrt(1 / 6))).toBeCloseTo(1, 12);
    expect(conditionWith(0.408248)).toBeCloseTo(1, 5);
    expect(conditionWith(1)).toBeCloseTo(2.44949, 6);
  });
});

describe('six axes without offsets', () => {
  const [upper, fore] = [0.6, 0.55];
  const rows = [
    [0, -1, 0.4],
    [upper, 0, 0],
    [0, -1, 0],
    [0, 1, fore],
    [0, -1, 0],
    [0, 0, 0],
  ];
  const arm: Arm = {
    convention: 'standard',
    joints: rows.map(([a, quarter, d], i) => turning({ a, alpha: quarter * RIGHT_ANGLE, d }, 1 + i)),
  };
  const chain = compileChain(arm);

  it('has |det J| = r · l2 · l3 · |sin of the elbow| · |sin q5| (each factor one singularity; derivable)', () => {
    const random = seededRandom(11);
    for (let i = 0; i < 200; i++) {
      const q = randomPosture(chain, random);
      const { pose, wristHeld } = analysePosture(arm, q);
      const r = Math.hypot(pose[0][3], pose[1][3]);
      // With the forearm along d4 the elbow is stretched where cos q3 is zero.
      const expected = r * upper * fore * Math.abs(Math.cos(q[2])) * Math.abs(Math.sin(q[4]));
      expect(wristHeld.manipulability).toBeCloseTo(expected, 12);
    }
  });

  it('shows the aligned wrist with the wrist held, and not with the wrist free', () => {
    const at = (q5: number) => analysePosture(arm, [0.1, -1, 0.3, 0.4, q5, 0.2]);
    const plain = at(-40 * DEGREE);
    const aligned = at(0.1 * DEGREE);
    expect(aligned.wristFree.inverseConditionNumber).toBeGreaterThan(0.5 * plain.wristFree.inverseConditionNumber!);
    expect(aligned.wristHeld.sureSpeed).toBeLessThan(0.01 * plain.wristHeld.sureSpeed!);
    expect(at(0).wristHeld.sureSpeed).toBe(0);
  });
});

describe('rules of thumb (common practice, no source)', () => {
  it('scaling by each joint’s own speed limit changes the result', () => {
    const even = analysePosture(twoLinks([2, 2]), bent).wristFree.inverseConditionNumber!;
    const plain = analysePosture(twoLinks([1, 1]), bent).wristFree.inverseConditionNumber!;
    const uneven = analysePosture(twoLinks([3, 5]), bent).wristFree.inverseConditionNumber!;
    expect(even).toBeCloseTo(plain, 12);
    expect(Math.abs(uneven - plain)).toBeGreaterThan(0.05);
  });

  it('for a redundant arm one joint motion moves nothing at the tool', () => {
    const arm: Arm = {
      convention: 'standard',
      joints: [-1, 1, 1, -1, -1, 1, 0].map((quarter, i) =>
        turning({ a: 0, alpha: quarter * RIGHT_ANGLE, d: [0.34, 0, 0.4, 0, 0.4, 0, 0.12][i] }),
      ),
    };
    const { jacobian: rows } = analysePosture(arm, [0.3, 0.5, -0.4, 1.1, 0.2, 0.7, -0.6]);
    const motion = new Float64Array(49);
    expect(nullSpace(Float64Array.from(rows.flat()), 6, 7, motion, new Float64Array(49))).toBe(1);
    expect(Math.hypot(...motion.subarray(0, 7))).toBeCloseTo(1, 12);
    for (const row of rows) expect(row.reduce((sum, value, i) => sum + value * motion[i], 0)).toBeCloseTo(0, 12);
  });

  it('a planar arm folded nearly flat is as close to singular as its angle says: condition 30 and 30,000', () => {
    const folded = (angle: number) => 1 / analysePosture(twoLinks(), [0, angle]).wristFree.inverseConditionNumber!;
    // σ1 σ2 = l1 l2 sin q2 and σ1² + σ2² is the sum of squared entries: solved for the angle by bisection.
    for (const condition of [3.4, 30, 30_000]) {
      let [near, far] = [0, 0.5 * Math.PI];
      for (let i = 0; i < 80; i++) {
        const middle = (near + far) / 2;
        if (folded(middle) > condition) near = middle;
        else far = middle;
      }
      const [x, y] = [0.5 + 0.4 * Math.cos(near), 0.4 * Math.sin(near)];
      const squares = x * x + y * y + 0.4 * 0.4;
      const product = 0.5 * 0.4 * Math.sin(near);
      // κ + 1/κ = (σ1² + σ2²) / (σ1 σ2)
      expect((condition + 1 / condition) / (squares / product)).toBeCloseTo(1, 8);
    }
  });
});
