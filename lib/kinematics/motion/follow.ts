import { makeDescent } from '../inverse/descent';
import { rowsToMatch } from '../freedoms';
import { forward } from '../chain';
import { LIMIT_SLACK } from '../limits';
import type { Solver } from '../solver';
import { worstMiss } from '../inverse/turns';
import type { Transform } from '../transforms';
import type { Arm } from '../types';

export interface Followed {
  /** A posture for each pose, as far as the arm got. */
  readonly postures: Float64Array[];
  /** Why it got no farther; null where it followed to the end. */
  readonly stop: {
    readonly reason: 'joint limit' | 'out of reach';
    readonly joint: number;
    readonly by: number;
  } | null;
}

export type Follower = (start: ArrayLike<number>, poses: readonly Transform[]) => Followed;

/** An error (m and rad together) up to which a pose counts as kept: far below what a controller keeps. */
const KEPT = 1e-7;

/**
 * Follows poses that lie close together, each from the posture before, without a jump of a joint: damped least squares from where the arm
 * stands (Wampler 1986). Works for every chain, redundant ones too, whose posture then goes the shortest way.
 */
export function makeFollower(arm: Arm, { chain, freedoms }: Solver): Follower {
  const descend = makeDescent(chain, rowsToMatch(arm, chain, freedoms), false);
  const u = new Float64Array(chain.actuators);
  const miss = new Float64Array(2);
  return (start, poses) => {
    const postures: Float64Array[] = [];
    for (let i = 0; i < chain.actuators; i++) u[i] = start[i];
    for (const pose of poses) {
      if (descend(u, pose, false).error > KEPT) return { postures, stop: { reason: 'out of reach', joint: -1, by: 0 } };
      const stop = beyondLimits(u);
      if (stop) return { postures, stop };
      postures.push(u.slice());
    }
    return { postures, stop: null };
  };

  function beyondLimits(values: Float64Array): Followed['stop'] {
    let joint = -1;
    let by = LIMIT_SLACK;
    for (let i = 0; i < chain.actuators; i++) {
      const beyond = Math.max(chain.min[i] - values[i], values[i] - chain.max[i]);
      if (beyond > by) [joint, by] = [i, beyond];
    }
    if (joint >= 0) return { reason: 'joint limit', joint, by };
    if (!chain.coupling) return null;
    worstMiss(chain, values, 0, miss);
    return miss[0] >= 0 && miss[1] > LIMIT_SLACK ? { reason: 'joint limit', joint: miss[0], by: miss[1] } : null;
  }
}

/** The class of branch that a posture belongs to, in words; '' for chains without classes or with a family of postures. */
export function branchOf(solver: Solver, posture: ArrayLike<number>): string {
  const { closedForm, chain } = solver;
  if (!closedForm || closedForm.family) return '';
  const { count, values, codes } = closedForm.solve(forwardFlange(solver, posture));
  const n = chain.actuators;
  let best = -1;
  let least = Infinity;
  for (let b = 0; b < count; b++) {
    let apart = 0;
    for (let i = 0; i < n; i++) {
      const difference = values[b * n + i] - posture[i];
      apart += chain.wholeTurns[i] ? 1 - Math.cos(difference) : difference * difference;
    }
    if (apart < least) [least, best] = [apart, b];
  }
  return best < 0 ? '' : closedForm.nameOf(codes[best]);
}

/** Closed forms take the flange in the frame of the chain's base. */
function forwardFlange(solver: Solver, posture: ArrayLike<number>): Transform {
  const { tool } = forward(solver.chain, posture, solver.stance);
  return Float64Array.from(solver.flangeOf(tool));
}
