import { strideOf, withinFamily } from '../inverse/family';
import { limitShare } from '../limits';
import type { Gauge } from '../measures/gauge';
import { middleCopy } from '../reach';
import type { Solver } from '../solver';
import type { Transform } from '../transforms';
import { CLEARLY_BETTER, CODE, note, type Cell } from './cell';
import { noteLimit } from './reference-judge';
import type { Judge } from './roll-search';

/** Halvings of the sample spacing round the best sample, and round the one nearest to the limits where none is inside. */
const BEST_HALVINGS = 6;
const ENTRY_HALVINGS = 12;
/** With a roll to search as well, the family is sampled this much coarser. */
const COARSER = 2;

/**
 * Judges redundant chains: the branches at even samples of the family, then closer about the best of them. Classes of one shape are measured once, and
 * speeds are only taken of the winner. Allocates nothing per cell.
 */
export function makeFamilyJudge(
  solver: Solver,
  gauge: Gauge,
  wanted: number,
  lastIsFree: boolean,
  searches: boolean,
  cell: Cell,
): Judge {
  const { chain } = solver;
  const closedForm = solver.closedForm!;
  const family = closedForm.family!;
  const samples = searches ? Math.ceil(family.samples / COARSER) : family.samples;
  const stride = strideOf({ ...family, samples });
  const within = withinFamily(family);
  const n = chain.actuators;
  const middle = (chain.min[n - 1] + chain.max[n - 1]) / 2;
  const posture = new Float64Array(n);
  const winner = new Float64Array(n);
  const values = new Float64Array(closedForm.classes);
  const measured = new Uint8Array(closedForm.classes);
  let place = 0;
  let moved = false;
  let won = false;

  function visit(flange: Transform, parameter: number) {
    const branches = closedForm.solve(flange, parameter);
    if (branches.count === 0 && branches.shortfall !== 'none') {
      const before = cell.by;
      note(cell, CODE[branches.shortfall], 0, branches.by);
      if (cell.by !== before) settle(parameter);
    }
    measured.fill(0);
    for (let b = 0; b < branches.count; b++) {
      const code = branches.codes[b];
      if (wanted >= 0 && code !== wanted) continue;
      if (lastIsFree) branches.values[(b + 1) * n - 1] = middle;
      if (!middleCopy(solver, branches.values, b * n, posture)) {
        const before = cell.by;
        const reason = cell.reason;
        noteLimit(solver, branches.values, b * n, cell);
        if (cell.by !== before || cell.reason !== reason) settle(parameter);
        continue;
      }
      const shape = closedForm.shapeOf(code);
      if (!measured[shape]) {
        values[shape] = gauge.readGains(solver.stand(posture)).inverseConditionNumber;
        measured[shape] = 1;
      }
      if (cell.reason === CODE.reached && values[shape] <= cell.value + CLEARLY_BETTER) continue;
      cell.reason = CODE.reached;
      cell.value = values[shape];
      cell.branch = code;
      winner.set(posture);
      won = true;
      settle(parameter);
    }
  }

  function settle(parameter: number) {
    place = parameter;
    moved = true;
  }

  /** Tries either side of the place settled on, closer and closer. */
  function close(flange: Transform, halvings: number, untilReached: boolean) {
    let step = stride / 2;
    for (let halving = 0; halving < halvings; halving++, step /= 2) {
      const centre = place;
      visit(flange, within(centre - step));
      visit(flange, within(centre + step));
      if (untilReached && cell.reason === CODE.reached) return;
    }
  }

  return (target) => {
    const flange = solver.flangeOf(target);
    moved = won = false;
    for (let k = 0; k < samples; k++) visit(flange, family.from + k * stride);
    if (moved && cell.reason !== CODE.reached) close(flange, ENTRY_HALVINGS, true);
    if (!won) return true;
    close(flange, BEST_HALVINGS, false);
    const reading = gauge.read(solver.stand(winner));
    cell.joint = 0;
    cell.value = reading.inverseConditionNumber;
    cell.maximumToolSpeed = reading.maximumToolSpeed;
    cell.sureSpeed = reading.sureSpeed;
    cell.limitShare = Math.max(0, limitShare(chain, winner));
    return true;
  };
}
