import { forward, makeStance, type Chain } from '../chain';
import { withinLimits } from '../limits';
import type { Transform } from '../transforms';
import type { Reason } from '../types';
import { makeDescent, THERE, type DescentResult } from './descent';
import { missBy, posturesInside } from './turns';

/**
 * Inverse kinematics for chains without a closed form: damped least squares from several fixed starts, so the same question gets
 * the same answer. Every other start may leave the limits on its way: isolated solutions are found better so, and whole turns
 * are taken off afterwards; and where all of them end outside, it is known which joint forbids the spot.
 */

const STARTS = 24;
/** Starts of the search for the nearest point, where nothing was found. */
const NEAREST_STARTS = 6;
/** Two postures closer than this (rad, m) are one solution. */
const SAME_POSTURE = 1e-6;
const POINT_ROWS = [0, 1, 2];

export interface NumericalAnswer {
  readonly solutions: number[][];
  /** Least error over all starts: m and rad together, as a root sum of squares. */
  readonly residual: number;
  readonly stop: DescentResult['stop'];
  readonly reason: Reason;
  /** Actuator (from zero) that forbids the spot, or −1; and by how much (rad, m), or how far the spot is out of reach (m). */
  readonly joint: number;
  readonly by: number;
}

/** `target`: tool pose in the frame that the base is given in. */
export type NumericalSolver = (target: Transform, freeRoll: boolean) => NumericalAnswer;

/** `rows` of the Jacobian that have to match where the roll is given; see rowsToMatch. */
export function makeNumericalSolver(chain: Chain, rows: readonly number[]): NumericalSolver {
  const fixed = makeDescent(chain, rows, false);
  const free = makeDescent(chain, [0, 1, 2, 3, 4, 5], true);
  const point = makeDescent(chain, POINT_ROWS, true);
  const stance = makeStance(chain);

  return (target, freeRoll) => {
    const descend = freeRoll ? free : fixed;
    const solutions: number[][] = [];
    let best: DescentResult = { error: Infinity, stop: 'stalled' };
    let joint = -1;
    let by = Infinity;
    let outside = false;
    for (let start = 0; start < STARTS; start++) {
      const insideLimits = start % 2 === 0;
      const u = startPosture(chain, start);
      const result = descend(u, target, insideLimits);
      if (result.error < best.error) best = result;
      if (result.error > THERE) continue;
      for (const posture of copiesWithin(chain, u)) addNew(solutions, posture);
      outside = true;
      const miss = worstMiss(chain, u);
      if (miss.by < by) ({ joint, by } = miss);
    }
    const found = { solutions, residual: best.error, stop: best.stop };
    if (solutions.length > 0) return { ...found, reason: 'reached', joint: -1, by: 0 };
    if (outside) return { ...found, reason: 'joint limit', joint, by: joint < 0 ? 0 : by };
    return { ...found, ...nearest(target) };
  };

  /** Nothing was found, not even outside the limits: is it the spot, or the direction? */
  function nearest(target: Transform): Pick<NumericalAnswer, 'reason' | 'joint' | 'by'> {
    let by = Infinity;
    let far = true;
    for (let start = 0; start < NEAREST_STARTS; start++) {
      const u = startPosture(chain, start);
      const { error } = point(u, target, false);
      if (error >= by) continue;
      by = error;
      const { tool, origins } = forward(chain, u, stance);
      const spread = (t: Transform) => Math.hypot(t[3] - origins[0], t[7] - origins[1], t[11] - origins[2]);
      far = spread(target) >= spread(tool);
    }
    if (by <= THERE) return { reason: 'direction', joint: -1, by: 0 };
    return { reason: far ? 'too far' : 'too near', joint: -1, by };
  }
}

/** The middle of every range first, then points of a Kronecker sequence (multiples of roots of primes, modulo 1). */
function startPosture(chain: Chain, start: number): Float64Array {
  const roots = [2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37].map(Math.sqrt);
  return Float64Array.from({ length: chain.actuators }, (_, i) => {
    const share = start === 0 ? 0.5 : 0.05 + 0.9 * ((start * roots[i % roots.length]) % 1);
    // Joints with many turns start within one turn of their middle: farther copies are the same posture.
    const middle = (chain.min[i] + chain.max[i]) / 2;
    const range = Math.min(chain.max[i] - chain.min[i], 2 * Math.PI);
    return middle + (share - 0.5) * range;
  });
}

/** Under a coupling whole turns of an actuator are no whole turns of a joint, so there only the posture itself counts. */
function copiesWithin(chain: Chain, u: Float64Array): number[][] {
  if (chain.coupling) return withinLimits(chain, u) ? [Array.from(u)] : [];
  return posturesInside(chain, u);
}

function addNew(solutions: number[][], posture: number[]) {
  if (!solutions.some((known) => known.every((value, i) => Math.abs(value - posture[i]) < SAME_POSTURE)))
    solutions.push(posture);
}

/** The actuator that is farthest outside; −1 and no distance where only chain joints of a coupling are. */
function worstMiss(chain: Chain, u: Float64Array): { joint: number; by: number } {
  let joint = -1;
  let by = 0;
  for (let i = 0; i < chain.actuators; i++) {
    const miss = chain.coupling ? Math.max(chain.min[i] - u[i], u[i] - chain.max[i]) : missBy(chain, i, u[i]);
    if (miss > by) {
      by = miss;
      joint = i;
    }
  }
  return { joint, by: joint < 0 ? Infinity : by };
}
