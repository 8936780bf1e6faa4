import { describe, expect, it } from 'vitest';
import { forward } from '../chain';
import { WRIST_FLIPPED } from '../inverse/spherical-wrist';
import { BUILT_IN_ARMS } from '../library';
import { makeGauge } from '../measures/gauge';
import { singularValues } from '../measures/singular-values';
import { middleCopy } from '../reach';
import { makeSolver } from '../solver';
import { WORKLOAD_ARM } from '../testing/grid-workload';
import { randomPosture, seededRandom } from '../testing/random';
import type { Arm } from '../types';
import { FLIPPED, PLAIN } from './branch-pairs';
import {
  ICN,
  LARGEST_GAIN,
  makePoseConditionGauge,
  makeSixAxisGauge,
  MAXIMUM_SPEED,
  SMALLEST_GAIN,
  SURE_SPEED,
} from './six-axis-gauge';

/** The reference is the general way: closed-form angles, forward kinematics, Jacobian, one-sided Jacobi and enumerated corners. */

const medium = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
const withRow = (arm: Arm, index: number, row: Partial<Arm['joints'][number]>): Arm => ({
  ...arm,
  joints: arm.joints.map((joint, i) => (i === index ? { ...joint, ...row } : joint)),
});

const ARMS: [string, Arm][] = [
  ...BUILT_IN_ARMS.filter(({ slug }) => slug.startsWith('six-axis')).map(({ slug, arm }): [string, Arm] => [slug, arm]),
  ['the workload arm', WORKLOAD_ARM],
  ['a crooked tool', { ...medium, tool: { xyz: [0.15, 0.02, 0.1], rpy: [0.1, 0.2, 0.3] } }],
  ['hung from a wall', { ...medium, base: { xyz: [0.4, -0.2, 1.1], rpy: [0.2, Math.PI / 2, 0.5] } }],
  ['a lateral offset', withRow(medium, 1, { d: 0.08 })],
  ['turned zero angles', withRow(withRow(medium, 1, { theta: -1.2 }), 4, { theta: 0.4 })],
];

/** Even draws, every third with joint 5 only 1e-1 … 1e-4 rad from a wrist with its axes in one line. */
function draws(chain: ReturnType<typeof makeSolver>['chain'], count: number): number[][] {
  const random = seededRandom(71);
  return Array.from({ length: count }, (_, k) => {
    const posture = randomPosture(chain, random);
    const small = 10 ** (-1 - (k % 4));
    if (k % 3 === 1) posture[4] = small * (random() < 0.5 ? -1 : 1);
    return posture;
  });
}

const closeTo = (ours: number, theirs: number, scale: number, what: string) =>
  expect(Math.abs(ours - theirs), `${what}: ${ours} and ${theirs}`).toBeLessThanOrEqual(1e-9 * scale);

describe.each(ARMS)('the six-axis path agrees with the general one to 1e-9: %s', (_, arm) => {
  const solver = makeSolver(arm);
  const { chain } = solver;
  const posture = new Float64Array(6);

  it.each(['free', 'held'] as const)('gains, speeds and limits of all branches, wrist %s', (mode) => {
    const quick = makeSixAxisGauge(chain, mode, false)!;
    const general = makeGauge(chain, solver.freedoms, mode);
    let compared = 0;
    let doubtful = 0;
    for (const drawn of draws(chain, 300)) {
      const tool = Float64Array.from(forward(chain, drawn, solver.stance).tool);
      quick.branches.orient(tool);
      const count = quick.branches.solve(tool);
      if (count < 0) {
        doubtful++;
        continue;
      }
      const branches = solver.closedForm!.solve(solver.flangeOf(tool));
      expect(branches.count).toBe(2 * count);
      const found = { values: branches.values.slice(), codes: branches.codes.slice() };
      for (let pair = 0; pair < count; pair++) {
        quick.read(pair);
        quick.readSpeeds();
        const ours = quick.reading.slice();
        for (const flip of [0, 1]) {
          const at = 2 * pair + flip;
          expect(found.codes[at]).toBe(quick.branches.codes[pair] | (flip ? WRIST_FLIPPED : 0));
          const inside = middleCopy(solver, found.values, 6 * at, posture);
          expect((quick.branches.inside[pair] & (flip ? FLIPPED : PLAIN)) !== 0).toBe(inside);
          const theirs = general.read(solver.stand(found.values.subarray(6 * at, 6 * at + 6)));
          const largest = theirs.gains[0];
          closeTo(ours[ICN], theirs.inverseConditionNumber, 1, 'ratio');
          closeTo(ours[LARGEST_GAIN], largest, largest, 'largest gain');
          closeTo(ours[SMALLEST_GAIN], theirs.gains[2], largest, 'smallest gain');
          closeTo(ours[MAXIMUM_SPEED], theirs.maximumToolSpeed, theirs.maximumToolSpeed, 'maximum speed');
          closeTo(ours[SURE_SPEED], theirs.sureSpeed, theirs.maximumToolSpeed, 'sure speed');
          compared++;
        }
      }
    }
    expect(compared).toBeGreaterThan(600);
    expect(doubtful).toBeLessThan(6);
  });

  it('condition of the whole matrix with a characteristic length', () => {
    const length = 0.5;
    const quick = makePoseConditionGauge(chain, length, false)!;
    const rows = new Float64Array(36);
    const values = new Float64Array(6);
    for (const drawn of draws(chain, 200)) {
      const tool = Float64Array.from(forward(chain, drawn, solver.stance).tool);
      quick.branches.orient(tool);
      const count = quick.branches.solve(tool);
      const branches = solver.closedForm!.solve(solver.flangeOf(tool)).values.slice();
      for (let pair = 0; pair < count; pair++) {
        quick.read(pair);
        const matrix = solver.stand(branches.subarray(12 * pair, 12 * pair + 6));
        for (let row = 0; row < 6; row++)
          for (let i = 0; i < 6; i++)
            rows[6 * row + i] = matrix[6 * row + i] * chain.maxSpeed[i] * (row < 3 ? 1 : length);
        singularValues(rows, 6, 6, values);
        closeTo(quick.reading[ICN], values[5] / values[0], 1, 'ratio');
      }
    }
  });
});

it('knows no other chains', () => {
  for (const { arm } of BUILT_IN_ARMS.filter(({ slug }) => !slug.startsWith('six-axis')))
    expect(makeSixAxisGauge(makeSolver(arm).chain, 'held', false)).toBeNull();
});
