import type { Chain } from '../chain';
import { driverOf, jointValue, LIMIT_SLACK, withinJointLimits } from '../limits';

/**
 * Whole turns: a revolute joint stands the same every 2π, so a value counts as inside when any copy of it is. Values are of the
 * actuators; under a coupling the chain joints that they drive have limits of their own to keep.
 */

const TURN = 2 * Math.PI;

/** Distance (rad, m) by which the nearest copy of a value misses the limits of actuator i; 0 inside. */
export function missBy(chain: Chain, i: number, value: number): number {
  return missOf(chain.min[i], chain.max[i], chain.wholeTurns[i] === 1, value);
}

function missOf(min: number, max: number, turns: boolean, value: number): number {
  if (!turns) return Math.max(0, min - value, value - max) - 0;
  const above = value + TURN * Math.ceil((min - LIMIT_SLACK - value) / TURN);
  if (above <= max + LIMIT_SLACK) return 0;
  return Math.min(above - max, min - (above - TURN));
}

/**
 * The worst miss of a posture, whole turns taken off: writes the actuator (−1 where none misses) and by how much to `out`. `at`: where
 * the posture starts in `values`. A chain joint that misses counts for the actuator that drives it.
 */
export function worstMiss(chain: Chain, values: Float64Array, at: number, out: Float64Array): void {
  out[0] = -1;
  out[1] = 0;
  for (let i = 0; i < chain.actuators; i++) {
    const miss = missBy(chain, i, values[at + i]);
    if (miss > out[1]) {
      out[0] = i;
      out[1] = miss;
    }
  }
  if (!chain.coupling) return;
  for (let j = 0; j < chain.joints; j++) {
    const turns = chain.prismatic[j] === 0;
    const miss = missOf(chain.jointMin[j], chain.jointMax[j], turns, jointValue(chain, j, values, at));
    if (miss > out[1]) {
      out[0] = driverOf(chain, j);
      out[1] = miss;
    }
  }
}

/** The copy of a value that stands nearest to the middle of the range; the value itself where none is inside. */
export function nearestToMiddle(chain: Chain, i: number, value: number): number {
  if (!chain.wholeTurns[i]) return value;
  const middle = (chain.min[i] + chain.max[i]) / 2;
  return value + TURN * Math.round((middle - value) / TURN);
}

/** Every copy inside the limits, lowest first. */
export function copiesInside(chain: Chain, i: number, value: number): number[] {
  if (missBy(chain, i, value) > LIMIT_SLACK) return [];
  if (!chain.wholeTurns[i]) return [value];
  const copies: number[] = [];
  let copy = value + TURN * Math.ceil((chain.min[i] - LIMIT_SLACK - value) / TURN);
  for (; copy <= chain.max[i] + LIMIT_SLACK; copy += TURN) copies.push(copy);
  return copies;
}

/** Joints of many turns each would multiply without end; beyond this many postures only the middle copy of a joint is taken. */
const MAX_COPIES = 4096;

/** All copies of a posture inside the limits. */
export function posturesInside(chain: Chain, posture: ArrayLike<number>): number[][] {
  let found: number[][] = [[]];
  for (let i = 0; i < chain.actuators; i++) {
    let copies = copiesInside(chain, i, posture[i]);
    if (found.length * copies.length > MAX_COPIES) copies = [copies[copies.length >> 1]];
    found = found.flatMap((start) => copies.map((copy) => [...start, copy]));
  }
  return chain.coupling ? found.filter((copy) => withinJointLimits(chain, copy)) : found;
}
