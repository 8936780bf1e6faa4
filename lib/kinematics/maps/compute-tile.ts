import { makeGauge, type Gauge } from '../measures/gauge';
import { missBy } from '../inverse/turns';
import { middleCopy, ROLL_SAMPLES } from '../reach';
import { makeSolver, type Solver } from '../solver';
import { orient, rolled } from '../target';
import { identityTransform, type Transform } from '../transforms';
import { REASONS, type Arm, type MapRequest, type MapTile, type Reason, type Vec3 } from '../types';
import { makeMapTile } from './tile-codec';

/** Computes rows of one map; made once, it can be called for many rows. Nothing is allocated per cell for closed-form arms. */
export interface MapComputer {
  readonly classes: readonly string[];
  tile(rowFrom: number, rowTo: number): MapTile;
}

const CODE = Object.fromEntries(REASONS.map((reason, index) => [reason, index])) as Record<Reason, number>;
const DOWN: Vec3 = [0, 0, -1];
/** Fresh measurements that narrow a free roll in on its best value, after the even samples. */
const ROLL_REFINEMENTS = 6;

/** What is known of the cell in hand. */
interface Cell {
  value: number;
  maximumToolSpeed: number;
  sureSpeed: number;
  limitShare: number;
  branch: number;
  roll: number;
  reason: number;
  joint: number;
  by: number;
}

/** Throws a RangeError where the request names a branch that the arm does not have. */
export function makeMapComputer(arm: Arm, request: MapRequest): MapComputer {
  const solver = makeSolver(arm);
  const gauge = makeGauge(solver.chain, solver.freedoms, request.wrist);
  const classes = solver.closedForm
    ? Array.from({ length: solver.closedForm.classes }, (_, code) => solver.closedForm!.nameOf(code))
    : [];
  const wanted = request.branch === 'best' ? -1 : classes.indexOf(request.branch);
  if (request.branch !== 'best' && wanted < 0) throw new RangeError(`This arm has no branch "${request.branch}".`);

  const pose = identityTransform();
  const turned = identityTransform();
  const posture = new Float64Array(solver.chain.actuators);
  const cell: Cell = emptyCell();
  const visit = solver.closedForm
    ? request.roll !== 'free'
      ? () => tryPose(pose, 0, false)
      : solver.toolOnLastAxis
        ? () => tryPose(pose, 0, true)
        : searchRoll
    : () => tryNumerically(solver, gauge, pose, request.roll === 'free', cell);

  const { origin, step, columns } = request.grid;
  const baseX = solver.chain.base[3];
  const baseY = solver.chain.base[7];
  const roll = request.roll === 'free' ? 0 : request.roll;

  function tile(rowFrom: number, rowTo: number): MapTile {
    const out = makeMapTile(rowFrom, rowTo, columns);
    const fixed = request.direction.kind === 'vector' ? request.direction.vector : DOWN;
    if (request.direction.kind !== 'outward') orient(fixed, roll, pose);
    for (let row = rowFrom; row < rowTo; row++)
      for (let column = 0; column < columns; column++) {
        pose[3] = origin[0] + column * step;
        pose[7] = origin[1] + row * step;
        pose[11] = request.toolHeight;
        if (request.direction.kind === 'outward') orientOutward(pose, baseX, baseY, request.direction.tilt, roll);
        resetCell(cell);
        visit();
        write(out, (row - rowFrom) * columns + column, cell);
      }
    return out;
  }

  /** Judges every branch of one pose; a free last joint is laid in the middle of its range. */
  function tryPose(target: Transform, turn: number, lastIsFree: boolean) {
    const { chain } = solver;
    const n = chain.joints;
    const branches = solver.closedForm!.solve(solver.flangeOf(target));
    if (branches.count === 0 && branches.shortfall !== 'none') note(cell, CODE[branches.shortfall], 0, branches.by);
    for (let b = 0; b < branches.count; b++) {
      if (wanted >= 0 && branches.codes[b] !== wanted) continue;
      const at = b * n;
      if (lastIsFree) branches.values[at + n - 1] = (chain.min[n - 1] + chain.max[n - 1]) / 2;
      if (!middleCopy(solver, branches.values, at, posture)) {
        noteLimit(solver, branches.values, at, cell);
        continue;
      }
      keepIfBetter(solver, gauge, posture, branches.codes[b], turn, cell);
    }
  }

  /** Even samples of the roll, then steps of falling size about the best of them. */
  function searchRoll() {
    for (let k = 0; k < ROLL_SAMPLES; k++) {
      const turn = (2 * Math.PI * k) / ROLL_SAMPLES;
      tryPose(rolled(pose, turn, turned), turn, false);
    }
    if (cell.reason !== CODE.reached) return;
    let stride = Math.PI / ROLL_SAMPLES;
    for (let pass = 0; pass < ROLL_REFINEMENTS; pass++, stride /= 2) {
      const centre = cell.roll;
      tryPose(rolled(pose, centre - stride, turned), centre - stride, false);
      tryPose(rolled(pose, centre + stride, turned), centre + stride, false);
    }
  }

  return { classes, tile };
}

/** Rows `rowFrom` to `rowTo` − 1 of a map. For several tiles of one map make the computer once. */
export function computeMapTile(arm: Arm, request: MapRequest, rowFrom: number, rowTo: number): MapTile {
  return makeMapComputer(arm, request).tile(rowFrom, rowTo);
}

function orientOutward(pose: Transform, baseX: number, baseY: number, tilt: number, roll: number) {
  const x = pose[3] - baseX;
  const y = pose[7] - baseY;
  const radius = Math.hypot(x, y);
  // Right above the base there is no outward; its x axis stands in.
  const c = Math.cos(tilt) / (radius || 1);
  orient([radius ? x * c : Math.cos(tilt), y * c, Math.sin(tilt)], roll, pose);
}

function emptyCell(): Cell {
  return {
    value: -1,
    maximumToolSpeed: NaN,
    sureSpeed: NaN,
    limitShare: NaN,
    branch: 0,
    roll: 0,
    reason: CODE['not found'],
    joint: 0,
    by: Infinity,
  };
}

function resetCell(cell: Cell) {
  cell.value = -1;
  cell.branch = 0;
  cell.roll = 0;
  cell.reason = CODE['not found'];
  cell.joint = 0;
  cell.by = Infinity;
}

/** Keeps the refusal that comes nearest to an answer: a joint limit before any shortfall, then the smaller miss. */
function note(cell: Cell, reason: number, joint: number, by: number) {
  if (cell.reason === CODE.reached) return;
  const nearer = reason === CODE['joint limit'] && cell.reason !== CODE['joint limit'];
  const farther = cell.reason === CODE['joint limit'] && reason !== CODE['joint limit'];
  if (farther || (!nearer && by >= cell.by)) return;
  cell.reason = reason;
  cell.joint = joint;
  cell.by = by;
}

function noteLimit(solver: Solver, values: Float64Array, at: number, cell: Cell) {
  let joint = 0;
  let by = 0;
  for (let i = 0; i < solver.chain.joints; i++) {
    const miss = missBy(solver.chain, i, values[at + i]);
    if (miss > by) {
      by = miss;
      joint = i + 1;
    }
  }
  note(cell, CODE['joint limit'], joint, by);
}

/** How much better another branch has to be before it takes a cell: keeps rounding from flickering between equal twins. */
const CLEARLY_BETTER = 1e-9;

function keepIfBetter(solver: Solver, gauge: Gauge, posture: Float64Array, code: number, turn: number, cell: Cell) {
  const reading = gauge.read(solver.stand(posture));
  const first = cell.reason !== CODE.reached;
  if (!first && reading.inverseConditionNumber <= cell.value + CLEARLY_BETTER) return;
  cell.reason = CODE.reached;
  cell.joint = 0;
  cell.value = reading.inverseConditionNumber;
  cell.maximumToolSpeed = reading.maximumToolSpeed;
  cell.sureSpeed = reading.sureSpeed;
  cell.branch = code;
  cell.roll = turn;
  cell.limitShare = leastShare(solver, posture);
}

function leastShare({ chain }: Solver, posture: Float64Array): number {
  let share = Infinity;
  for (let i = 0; i < chain.actuators; i++) {
    const left = Math.min(posture[i] - chain.min[i], chain.max[i] - posture[i]);
    share = Math.min(share, left / (chain.max[i] - chain.min[i]));
  }
  return Math.max(0, share);
}

function tryNumerically(solver: Solver, gauge: Gauge, pose: Transform, freeRoll: boolean, cell: Cell) {
  const { solutions, reason, joint, by } = solver.solveNumerically(pose, freeRoll);
  for (const posture of solutions) keepIfBetter(solver, gauge, Float64Array.from(posture), 0, 0, cell);
  if (solutions.length === 0) note(cell, CODE[reason], joint + 1, by);
}

function write(out: MapTile, at: number, cell: Cell) {
  out.reason[at] = cell.reason;
  out.bindingJoint[at] = cell.joint;
  if (cell.reason !== CODE.reached) return;
  out.branch[at] = cell.branch;
  out.inverseConditionNumber[at] = cell.value;
  out.maximumToolSpeed[at] = cell.maximumToolSpeed;
  out.sureSpeed[at] = cell.sureSpeed;
  out.limitShare[at] = cell.limitShare;
}
