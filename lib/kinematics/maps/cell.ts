import { REASONS, type MapTile, type Reason } from '../types';

/** What is known of the cell in hand. One object for a whole map, so that no cell costs memory. */
export interface Cell {
  value: number;
  maximumToolSpeed: number;
  sureSpeed: number;
  limitShare: number;
  /** Share of the directions asked for that are reached. */
  coverage: number;
  branch: number;
  roll: number;
  reason: number;
  joint: number;
  by: number;
}

/** A reason's place in a stored map. */
export const CODE = Object.fromEntries(REASONS.map((reason, index) => [reason, index])) as Record<Reason, number>;

/** How much better another branch has to be before it takes a cell: keeps rounding from flickering between equal twins. */
export const CLEARLY_BETTER = 1e-9;

export function emptyCell(): Cell {
  return {
    value: -1,
    maximumToolSpeed: NaN,
    sureSpeed: NaN,
    limitShare: NaN,
    coverage: 0,
    branch: 0,
    roll: 0,
    reason: CODE['not found'],
    joint: 0,
    by: Infinity,
  };
}

export function resetCell(cell: Cell) {
  cell.value = -1;
  cell.branch = 0;
  cell.roll = 0;
  cell.reason = CODE['not found'];
  cell.joint = 0;
  cell.by = Infinity;
}

/** Keeps the refusal that comes nearest to an answer: a joint limit before any shortfall, then the smaller miss. */
export function note(cell: Cell, reason: number, joint: number, by: number) {
  if (cell.reason === CODE.reached) return;
  const nearer = reason === CODE['joint limit'] && cell.reason !== CODE['joint limit'];
  const farther = cell.reason === CODE['joint limit'] && reason !== CODE['joint limit'];
  if (farther || (!nearer && by >= cell.by)) return;
  cell.reason = reason;
  cell.joint = joint;
  cell.by = by;
}

export function write(out: MapTile, at: number, cell: Cell) {
  out.reason[at] = cell.reason;
  out.bindingJoint[at] = cell.joint;
  out.wristCoverage[at] = cell.coverage;
  if (cell.reason !== CODE.reached) return;
  out.branch[at] = cell.branch;
  out.inverseConditionNumber[at] = cell.value;
  out.maximumToolSpeed[at] = cell.maximumToolSpeed;
  out.sureSpeed[at] = cell.sureSpeed;
  out.limitShare[at] = cell.limitShare;
}
