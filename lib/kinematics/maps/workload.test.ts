import { describe, expect, it } from 'vitest';
import { makeGauge } from '../measures/gauge';
import { middleCopy } from '../reach';
import { makeSolver } from '../solver';
import { WORKLOAD_ARM, workloadRequest } from '../testing/grid-workload';
import { computeMapTile } from './compute-tile';

/**
 * Counts and sums over the grid as a separate program, written in C++ by others and used to measure speed against, printed them for
 * the same workload (wrist free, polytope speeds): all branches of all spots, modulo whole turns, the best one by inverse condition number.
 */
const THEIRS = {
  reached: 23_685,
  branchesInside: 84_364,
  inverseConditionNumber: 9729.04284042,
  maximumToolSpeed: 164360.086421,
  sureSpeed: 56145.2733942,
};

describe('the grid workload', () => {
  it('has the counts and sums of the separate program', () => {
    const solver = makeSolver(WORKLOAD_ARM);
    const gauge = makeGauge(solver.chain, solver.freedoms, 'free');
    const pose = Float64Array.of(1, 0, 0, 0, 0, -1, 0, 0, 0, 0, -1, 0.3);
    const posture = new Float64Array(6);
    const ours = { reached: 0, branchesInside: 0, inverseConditionNumber: 0, maximumToolSpeed: 0, sureSpeed: 0 };
    for (let cell = 0; cell < 40_000; cell++) {
      pose[3] = -1.7 + (3.4 * (cell % 200)) / 199;
      pose[7] = -1.7 + (3.4 * Math.floor(cell / 200)) / 199;
      const branches = solver.closedForm!.solve(solver.flangeOf(pose));
      let best = { inverseConditionNumber: -1, maximumToolSpeed: 0, sureSpeed: 0 };
      for (let branch = 0; branch < branches.count; branch++) {
        if (!middleCopy(solver, branches.values, 6 * branch, posture)) continue;
        ours.branchesInside++;
        const reading = gauge.read(solver.stand(posture));
        if (reading.inverseConditionNumber > best.inverseConditionNumber + 1e-9) best = { ...reading };
      }
      if (best.inverseConditionNumber < 0) continue;
      ours.reached++;
      ours.inverseConditionNumber += best.inverseConditionNumber;
      ours.maximumToolSpeed += best.maximumToolSpeed;
      ours.sureSpeed += best.sureSpeed;
    }
    expect(ours.reached).toBe(THEIRS.reached);
    expect(ours.branchesInside).toBe(THEIRS.branchesInside);
    for (const sum of ['inverseConditionNumber', 'maximumToolSpeed', 'sureSpeed'] as const)
      expect(Math.abs(ours[sum] / THEIRS[sum] - 1), sum).toBeLessThan(1e-9);
  });

  it('comes out of the map computer too, within what 32-bit planes hold', () => {
    const tile = computeMapTile(WORKLOAD_ARM, workloadRequest('free'), 0, 200);
    const sum = (plane: Float32Array) => plane.reduce((total, value) => total + (Number.isNaN(value) ? 0 : value), 0);
    expect(tile.reason.filter((reason) => reason === 0)).toHaveLength(THEIRS.reached);
    for (const field of ['inverseConditionNumber', 'maximumToolSpeed', 'sureSpeed'] as const)
      expect(Math.abs(sum(tile[field]) / THEIRS[field] - 1), field).toBeLessThan(1e-8);
  });
});
