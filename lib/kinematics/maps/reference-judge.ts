import { worstMiss } from '../inverse/turns';
import { limitShare } from '../limits';
import type { Gauge } from '../measures/gauge';
import { middleCopy } from '../reach';
import type { Solver } from '../solver';
import { CLEARLY_BETTER, CODE, note, type Cell } from './cell';
import type { Judge } from './roll-search';

/**
 * Judges every branch of one pose of any chain with a closed form, by the general solver and gauge; never gives up. `wanted`: class of
 * branch, or −1 for the best of all. `lastIsFree`: a free last joint is laid in the middle of its range.
 */
export function makeReferenceJudge(
  solver: Solver,
  gauge: Gauge,
  wanted: number,
  lastIsFree: boolean,
  cell: Cell,
): Judge {
  const { chain, closedForm } = solver;
  const n = chain.actuators;
  const posture = new Float64Array(chain.actuators);
  return (target) => {
    const branches = closedForm!.solve(solver.flangeOf(target));
    if (branches.count === 0 && branches.shortfall !== 'none') note(cell, CODE[branches.shortfall], 0, branches.by);
    for (let b = 0; b < branches.count; b++) {
      if (wanted >= 0 && branches.codes[b] !== wanted) continue;
      const at = b * n;
      if (lastIsFree) branches.values[at + n - 1] = (chain.min[n - 1] + chain.max[n - 1]) / 2;
      if (middleCopy(solver, branches.values, at, posture))
        keepIfBetter(solver, gauge, posture, branches.codes[b], cell);
      else noteLimit(solver, branches.values, at, cell);
    }
    return true;
  };
}

/** The same for chains without a closed form; allocates. */
export function makeNumericalJudge(solver: Solver, gauge: Gauge, freeRoll: boolean, cell: Cell): Judge {
  return (target) => {
    const { solutions, reason, joint, by } = solver.solveNumerically(target, freeRoll);
    for (const posture of solutions) keepIfBetter(solver, gauge, Float64Array.from(posture), 0, cell);
    if (solutions.length === 0) note(cell, CODE[reason], joint + 1, by);
    return true;
  };
}

const miss = new Float64Array(2);

export function noteLimit({ chain }: Solver, values: Float64Array, at: number, cell: Cell) {
  worstMiss(chain, values, at, miss);
  note(cell, CODE['joint limit'], miss[0] + 1, miss[1]);
}

function keepIfBetter(solver: Solver, gauge: Gauge, posture: Float64Array, code: number, cell: Cell) {
  const reading = gauge.read(solver.stand(posture));
  const first = cell.reason !== CODE.reached;
  if (!first && reading.inverseConditionNumber <= cell.value + CLEARLY_BETTER) return;
  cell.reason = CODE.reached;
  cell.joint = 0;
  cell.value = reading.inverseConditionNumber;
  cell.maximumToolSpeed = reading.maximumToolSpeed;
  cell.sureSpeed = reading.sureSpeed;
  cell.branch = code;
  cell.limitShare = Math.max(0, limitShare(solver.chain, posture));
}
