import type { Chain } from '../chain';
import { C1, C4, C5, CA, CB, PAIR, S1, S4, S5, S_ELBOW, SA, SB, SIXTH, type BranchPairs } from './branch-pairs';

/** How near the joints of one flip stand to their limits. Only here are angles taken: for the branch that won, or to name a limit. */
export interface LimitOffsets {
  /** Share of range left to the nearest limit of the joints read, 0 … 0.5; by how much (rad) the worst of them is beyond its limits; which (1 … 6, 0 for none). */
  readonly answers: Float64Array;
  /** `from` and `to`: joints from zero, `to` excluded. */
  read(pair: number, flipped: boolean, from: number, to: number): void;
}

export const SHARE = 0;
export const MISS = 1;
export const JOINT = 2;

export function makeLimitOffsets(
  { pairs, windows, turn3, fillSixth, shared }: BranchPairs,
  chain: Chain,
): LimitOffsets {
  const half = Float64Array.from(chain.min, (low, i) => (chain.max[i] - low) / 2);
  /** Cosine and sine of each joint as the windows count it. */
  const turns = new Float64Array(12);
  const answers = new Float64Array(3);

  function read(pair: number, flipped: boolean, from: number, to: number) {
    const at = pair * PAIR;
    const sign = flipped ? -1 : 1;
    turns[0] = pairs[at + C1];
    turns[1] = pairs[at + S1];
    turns[2] = pairs[at + CA];
    turns[3] = pairs[at + SA];
    turns[4] = pairs[at + CA] * pairs[at + CB] + pairs[at + SA] * pairs[at + SB];
    turns[5] = turn3 * pairs[at + S_ELBOW];
    turns[6] = sign * pairs[at + C4];
    turns[7] = sign * pairs[at + S4];
    turns[8] = pairs[at + C5];
    turns[9] = sign * pairs[at + S5];
    if (to > 5) {
      fillSixth(pair);
      turns[10] = sign * shared[SIXTH];
      turns[11] = sign * shared[SIXTH + 1];
    }
    let most = 0;
    answers[MISS] = 0;
    answers[JOINT] = 0;
    for (let i = from; i < to; i++) {
      const c = turns[2 * i];
      const s = turns[2 * i + 1];
      const wc = windows[2 * i];
      const ws = windows[2 * i + 1];
      const off = Math.atan2(Math.abs(s * wc - c * ws), c * wc + s * ws);
      most = Math.max(most, off / half[i]);
      if (off - half[i] > answers[MISS]) {
        answers[MISS] = off - half[i];
        answers[JOINT] = i + 1;
      }
    }
    answers[SHARE] = Math.max(0, 0.5 - most / 2);
  }

  return { answers, read };
}
