import { C4, C5, CA, CB, PAIR, S4, S5, S_ELBOW, SA, SB, type BranchPairs } from './branch-pairs';

/**
 * How far both flips of a pair stand inside their limits, as the least difference of cosines over joints 2 to 5: smooth but for kinks, zero where
 * the flip leaves its limits. Writes the plain flip's to out[0], the flipped one's to out[1].
 */
export function makeLimitMargins({ pairs, windows, edges, turn3 }: BranchPairs, out: Float64Array) {
  const [, , twoC, twoS, threeC, threeS, fourC, fourS, fiveC, fiveS] = windows;
  const [, twoEdge, threeEdge, fourEdge, fiveEdge] = edges;
  return (pair: number) => {
    const at = pair * PAIR;
    const ca = pairs[at + CA];
    const sa = pairs[at + SA];
    const cElbow = ca * pairs[at + CB] + sa * pairs[at + SB];
    const in2 = ca * twoC + sa * twoS - twoEdge;
    const in3 = cElbow * threeC + pairs[at + S_ELBOW] * turn3 * threeS - threeEdge;
    const mid4 = pairs[at + C4] * fourC + pairs[at + S4] * fourS;
    const mid5 = pairs[at + C5] * fiveC - fiveEdge;
    const aside5 = pairs[at + S5] * fiveS;
    const both = Math.min(in2, in3);
    out[0] = Math.min(both, mid4 - fourEdge, mid5 + aside5);
    out[1] = Math.min(both, -mid4 - fourEdge, mid5 - aside5);
  };
}
