import type { Chain } from '../chain';
import { LIMIT_SLACK } from '../limits';

/**
 * Whole turns: a revolute joint stands the same every 2π, so a value counts as inside when any copy of it is. Only for
 * chains without a coupling, where a chain joint is its own actuator.
 */

const TURN = 2 * Math.PI;

/** Distance (rad, m) by which the nearest copy of a value misses the limits of joint i; 0 inside. */
export function missBy(chain: Chain, i: number, value: number): number {
  if (chain.prismatic[i]) return Math.max(0, chain.min[i] - value, value - chain.max[i]) - 0;
  const above = value + TURN * Math.ceil((chain.min[i] - LIMIT_SLACK - value) / TURN);
  if (above <= chain.max[i] + LIMIT_SLACK) return 0;
  return Math.min(above - chain.max[i], chain.min[i] - (above - TURN));
}

/** The copy of a value that stands nearest to the middle of the range; the value itself where none is inside. */
export function nearestToMiddle(chain: Chain, i: number, value: number): number {
  if (chain.prismatic[i]) return value;
  const middle = (chain.min[i] + chain.max[i]) / 2;
  return value + TURN * Math.round((middle - value) / TURN);
}

/** Every copy inside the limits, lowest first. */
export function copiesInside(chain: Chain, i: number, value: number): number[] {
  if (missBy(chain, i, value) > LIMIT_SLACK) return [];
  if (chain.prismatic[i]) return [value];
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
  for (let i = 0; i < chain.joints; i++) {
    let copies = copiesInside(chain, i, posture[i]);
    if (found.length * copies.length > MAX_COPIES) copies = [copies[copies.length >> 1]];
    found = found.flatMap((start) => copies.map((copy) => [...start, copy]));
  }
  return found;
}
