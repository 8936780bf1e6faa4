import { Matrix, SingularValueDecomposition } from 'ml-matrix';
import { middleCopy } from '@/lib/kinematics/reach';
import { makeSolver } from '@/lib/kinematics/solver';
import { WORKLOAD_ARM } from '@/lib/kinematics/testing/grid-workload';
import { milliseconds, perSecond, ratio, table, title } from './print';
import { interleaved, secondsOf } from './rounds';
import { downwards, LENGTH_M, makeWorkload, noTotals, placeTool, SIDE, type Totals } from './workload';

/** The same closed-form branches, their singular values by ml-matrix: of the translational block, or of the full matrix as well. */
function makeByLibrary(full: boolean): () => Totals {
  const solver = makeSolver(WORKLOAD_ARM);
  const { maxSpeed } = solver.chain;
  const tool = downwards();
  const posture = new Float64Array(6);

  function gainsOf(rows: number): number[] {
    // Six rows at least: the library wants a matrix at least as tall as wide.
    const tall = Array.from({ length: 6 }, (_, i) =>
      Array.from({ length: rows }, (_, r) => solver.matrix[6 * r + i] * maxSpeed[i] * (r < 3 ? 1 : LENGTH_M)),
    );
    const options = { computeLeftSingularVectors: false, computeRightSingularVectors: false };
    return new SingularValueDecomposition(new Matrix(tall), options).diagonal;
  }

  return () => {
    const totals = noTotals();
    for (let cell = 0; cell < SIDE * SIDE; cell++) {
      placeTool(tool, cell);
      const branches = solver.closedForm!.solve(solver.flangeOf(tool), 0);
      const best = { value: -1, ickT: 0, vmax: 0, vg: 0 };
      for (let b = 0; b < branches.count; b++) {
        if (!middleCopy(solver, branches.values, 6 * b, posture)) continue;
        totals.inlimit++;
        totals.evals++;
        solver.stand(posture);
        const linear = gainsOf(3);
        const whole = full ? gainsOf(6) : linear;
        const value = whole[whole.length - 1] / whole[0];
        if (value <= best.value) continue;
        Object.assign(best, { value, ickT: linear[2] / linear[0], vmax: linear[0], vg: linear[2] });
      }
      if (best.value < 0) continue;
      totals.reach++;
      totals.best += best.value;
      totals.ickT += best.ickT;
      totals.vmax += best.vmax;
      totals.vg += best.vg;
    }
    return totals;
  };
}

export async function compareWithLibrary() {
  title('The same branches with singular values by ml-matrix, one thread');
  const rows: string[][] = [];
  for (const [kind, name] of [
    ['T', 'translational block'],
    ['TF', 'and full matrix'],
  ] as const) {
    const ours = makeWorkload(kind);
    const theirs = makeByLibrary(kind === 'TF');
    const [mine, other] = await interleaved([
      { name: 'ours', run: () => secondsOf(ours) },
      { name: 'library', run: () => secondsOf(theirs) },
    ]);
    const agree = Math.abs(ours().best / theirs().best - 1);
    rows.push([
      name,
      milliseconds(mine),
      perSecond((SIDE * SIDE) / mine),
      milliseconds(other),
      ratio(other / mine),
      agree.toExponential(1),
    ]);
  }
  table(['40 000 spots', 'ours', 'spots/s', 'ml-matrix', 'ours is', 'sums differ by'], rows);
}
