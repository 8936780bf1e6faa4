import { spreadDirections } from '../measures/wrist-coverage';
import { orient } from '../target';
import { identityTransform, type Transform } from '../transforms';
import type { MapCone } from '../types';
import { CODE, emptyCell, note, resetCell, type Cell } from './cell';

/** Directions sampled where nobody says how many: the outermost lie within a fiftieth of the half angle from the rim. */
export const CONE_SAMPLES = 24;

/**
 * Judges one spot with the tool in every sampled direction of a cone about the tool axis of `pose`, and leaves in `cell` the worst
 * values of all and the share reached. Where a direction is missing, the cell is not reached, for the reason that comes nearest.
 * `visit` judges the one orientation that `pose` holds into `cell`. Throws a RangeError for a cone that is none.
 */
export function makeConeSweep(cone: MapCone, roll: number, pose: Transform, cell: Cell, visit: () => void): () => void {
  const { halfAngle, samples } = cone;
  if (!(halfAngle > 0 && samples >= 1)) throw new RangeError('A cone opens by more than 0° and has directions in it.');
  const about = spreadDirections({ kind: 'cone', axis: [0, 0, 1], halfAngle }, samples).flat();
  const axis = identityTransform();
  const direction: [number, number, number] = [0, 0, 0];
  const worst = emptyCell();
  const refusal = emptyCell();

  return () => {
    axis.set(pose);
    resetCell(refusal);
    worst.value = worst.maximumToolSpeed = worst.sureSpeed = worst.limitShare = Infinity;
    let reached = 0;
    for (let k = 0; k < samples; k++) {
      for (let i = 0; i < 3; i++)
        direction[i] =
          axis[4 * i] * about[3 * k] + axis[4 * i + 1] * about[3 * k + 1] + axis[4 * i + 2] * about[3 * k + 2];
      orient(direction, roll, pose);
      visit();
      if (cell.reason !== CODE.reached) {
        // The quick path does not say how far beyond reach a spot lies: any of its refusals stands until a nearer one comes.
        if (refusal.reason === CODE['not found']) refusal.reason = cell.reason;
        note(refusal, cell.reason, cell.joint, cell.by);
        continue;
      }
      reached++;
      if (cell.value < worst.value) {
        worst.value = cell.value;
        worst.branch = cell.branch;
      }
      worst.maximumToolSpeed = Math.min(worst.maximumToolSpeed, cell.maximumToolSpeed);
      worst.sureSpeed = Math.min(worst.sureSpeed, cell.sureSpeed);
      worst.limitShare = Math.min(worst.limitShare, cell.limitShare);
    }
    for (let i = 0; i < 12; i++) pose[i] = axis[i];
    const whole = reached === samples;
    cell.reason = whole ? CODE.reached : refusal.reason;
    cell.joint = whole ? 0 : refusal.joint;
    cell.by = refusal.by;
    cell.value = worst.value;
    cell.branch = worst.branch;
    cell.maximumToolSpeed = worst.maximumToolSpeed;
    cell.sureSpeed = worst.sureSpeed;
    cell.limitShare = worst.limitShare;
    cell.coverage = reached / samples;
  };
}
