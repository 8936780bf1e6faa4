import type { Chain } from '../chain';
import { C1, C4, C5, CA, CB, PAIR, S1, S4, S5, S_ELBOW, SA, SB, type BranchPairs, SIXTH } from './branch-pairs';

/**
 * Share of range left to the nearest limit, 0 … 0.5, into `out[0]`; joint 6 is left out where it is free, joint 1 where `from` is 1. Only here are
 * angles taken, for the branch that won.
 */
export function makeLimitShare(branches: BranchPairs, chain: Chain, out: Float64Array, from: 0 | 1 = 0) {
  const { pairs, windows, turn3, fillSixth, shared } = branches;
  const perRange = Float64Array.from(chain.min, (low, i) => 1 / (chain.max[i] - low));

  /** How far joint i stands from mid-range, as a share of its range. */
  function off(i: number, c: number, s: number) {
    const wc = windows[2 * i];
    const ws = windows[2 * i + 1];
    const share = Math.atan2(Math.abs(s * wc - c * ws), c * wc + s * ws) * perRange[i];
    if (share > out[0]) out[0] = share;
  }

  return (pair: number, flipped: boolean, lastIsFree: boolean) => {
    const at = pair * PAIR;
    const sign = flipped ? -1 : 1;
    out[0] = 0;
    if (from === 0) off(0, pairs[at + C1], pairs[at + S1]);
    off(1, pairs[at + CA], pairs[at + SA]);
    const cElbow = pairs[at + CA] * pairs[at + CB] + pairs[at + SA] * pairs[at + SB];
    off(2, cElbow, turn3 * pairs[at + S_ELBOW]);
    off(3, sign * pairs[at + C4], sign * pairs[at + S4]);
    off(4, pairs[at + C5], sign * pairs[at + S5]);
    if (!lastIsFree) {
      fillSixth(pair);
      off(5, sign * shared[SIXTH], sign * shared[SIXTH + 1]);
    }
    out[0] = Math.max(0, 0.5 - out[0]);
  };
}
