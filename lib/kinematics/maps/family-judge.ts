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
const BEST_HALVINGS = 8;
const ENTRY_HALVINGS = 12;
/** Peaks along the samples that are climbed, as the best sample need not lie on the highest peak; and how far below it a peak may start. */
const PEAKS = 3;
const PEAK_SLACK = 0.15;
/** With a roll to search as well, the family is sampled this much coarser. */
const COARSER = 2;

/**
 * Judges redundant chains: the branches at even samples of the family, then closer about the highest peaks among them. Classes of one shape are measured once, and
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
  const peaks = new Float64Array(samples);
  const climbed = new Uint8Array(samples);
  let place = 0;
  let moved = false;
  let won = false;

  /** The best value at one place of the family, −1 where none is reached; the best of all is kept in the cell. */
  function visit(flange: Transform, parameter: number): number {
    let here = -1;
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
      here = Math.max(here, values[shape]);
      if (cell.reason === CODE.reached && values[shape] <= cell.value + CLEARLY_BETTER) continue;
      cell.reason = CODE.reached;
      cell.value = values[shape];
      cell.branch = code;
      winner.set(posture);
      won = true;
      settle(parameter);
    }
    return here;
  }

  function settle(parameter: number) {
    place = parameter;
    moved = true;
  }

  /** Tries either side of the place that misses by least, closer and closer, until something is reached. */
  function enter(flange: Transform) {
    let step = stride / 2;
    for (let halving = 0; halving < ENTRY_HALVINGS && cell.reason !== CODE.reached; halving++, step /= 2) {
      const centre = place;
      visit(flange, within(centre - step));
      visit(flange, within(centre + step));
    }
    return cell.reason === CODE.reached;
  }

  /** Climbs from one place to the top near it, with steps of falling size. */
  function climb(flange: Transform, from: number, value: number) {
    let centre = from;
    let most = value;
    for (let halving = 0, step = stride / 2; halving < BEST_HALVINGS; halving++, step /= 2) {
      const middle = centre;
      for (let side = -1; side <= 1; side += 2) {
        const trial = within(middle + side * step);
        const there = visit(flange, trial);
        if (there > most) {
          most = there;
          centre = trial;
        }
      }
    }
  }

  /** Climbs the highest peaks of the samples; an open family's ends may be peaks too. */
  function climbPeaks(flange: Transform) {
    const last = samples - 1;
    climbed.fill(0);
    for (let peak = 0; peak < PEAKS; peak++) {
      let top = -1;
      for (let k = 0; k < samples; k++) {
        const before = k > 0 ? peaks[k - 1] : family.closed ? peaks[last] : -1;
        const after = k < last ? peaks[k + 1] : family.closed ? peaks[0] : -1;
        const isPeak = peaks[k] >= 0 && !climbed[k] && peaks[k] >= before && peaks[k] >= after;
        if (isPeak && (top < 0 || peaks[k] > peaks[top])) top = k;
      }
      if (top < 0 || (peak > 0 && peaks[top] < cell.value - PEAK_SLACK)) return;
      climb(flange, family.from + top * stride, peaks[top]);
      climbed[top] = 1;
    }
  }

  return (target) => {
    const flange = solver.flangeOf(target);
    moved = won = false;
    for (let k = 0; k < samples; k++) peaks[k] = visit(flange, family.from + k * stride);
    if (cell.reason !== CODE.reached && moved && enter(flange)) climb(flange, place, cell.value);
    else climbPeaks(flange);
    if (!won) return true;
    const reading = gauge.read(solver.stand(winner));
    cell.joint = 0;
    cell.value = reading.inverseConditionNumber;
    cell.maximumToolSpeed = reading.maximumToolSpeed;
    cell.sureSpeed = reading.sureSpeed;
    cell.limitShare = Math.max(0, limitShare(chain, winner));
    return true;
  };
}
