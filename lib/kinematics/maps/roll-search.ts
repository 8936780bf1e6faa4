import { ROLL_SAMPLES } from '../reach';
import { rolled } from '../target';
import { identityTransform, type Transform } from '../transforms';
import { CODE, type Cell } from './cell';

/** Judges the branches of one pose into the cell; false where it can't and the cell has to be left to another judge. */
export type Judge = (target: Transform) => boolean;

/** Fresh measurements that narrow a free roll in on its best value, after the even samples. */
const ROLL_REFINEMENTS = 6;

/** Even samples of the roll, then steps of falling size about the best of them. */
export function makeRollSearch(pose: Transform, cell: Cell, judge: Judge): () => boolean {
  const turned = identityTransform();
  const best = new Float64Array(2);

  const tryTurn = (turn: number): boolean => {
    best[0] = cell.value;
    const judged = judge(rolled(pose, turn, turned));
    if (cell.value !== best[0]) cell.roll = turn;
    return judged;
  };

  return () => {
    for (let k = 0; k < ROLL_SAMPLES; k++) if (!tryTurn((2 * Math.PI * k) / ROLL_SAMPLES)) return false;
    if (cell.reason !== CODE.reached) return true;
    let stride = Math.PI / ROLL_SAMPLES;
    for (let pass = 0; pass < ROLL_REFINEMENTS; pass++, stride /= 2) {
      const centre = cell.roll;
      if (!tryTurn(centre - stride) || !tryTurn(centre + stride)) return false;
    }
    return true;
  };
}
