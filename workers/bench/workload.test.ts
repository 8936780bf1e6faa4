import { expect, it } from 'vitest';
import { makeWorkload } from './workload';

/** As the separate C++ program printed them for the same workload (b1.T.jac.tool, b1.TF.jac.tool, b1.TFP.jac.tool). */
const THEIRS = {
  T: { best: 9729.04284042, ickT: 9729.04284042, vmax: 85386.0476821, vg: 34464.5786731 },
  TF: { best: 4677.71436744, ickT: 9287.05463285, vmax: 84091.6923329, vg: 32354.967499 },
  TFP: { best: 4677.71436744, ickT: 9287.05463285, vmax: 161460.625522, vg: 50848.9863059 },
};

it.each(['T', 'TF', 'TFP'] as const)('workload %s has the counts and sums of the separate program', (kind) => {
  const ours = makeWorkload(kind)();
  expect(ours.reach).toBe(23_685);
  expect(ours.inlimit).toBe(84_364);
  for (const sum of ['best', 'ickT', 'vmax', 'vg'] as const)
    expect(Math.abs(ours[sum] / THEIRS[kind][sum] - 1), sum).toBeLessThan(1e-9);
});
