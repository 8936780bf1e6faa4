import { ABSENT, CLASS, FACING, KNOT, MISS, SIDE, SQUARE, STATUS } from './knot';
import type { Profile } from './profile';
import type { Symmetry } from './symmetry';

/** Two joints or sides that miss by less than this apart (rad): which one to name is left to the single cell. */
const TIE = 3e-3;
export const CANNOT_TELL = 0;

/**
 * The joint (from one) that keeps the arm from a spot beyond its limits: on the side that misses by less, the one that misses by most. `spot` holds x
 * and y in the map's plane about axis 1.
 */
export function makeLimitNamer({ knots }: Profile, { first, halfRanges }: Symmetry, spot: Float64Array) {
  const [middleC, middleS, edge] = first;
  return (piece: number): number => {
    const knot = piece * KNOT;
    const x = spot[0];
    const y = spot[1];
    const from = knots[knot + SQUARE];
    const t = (x * x + y * y - from) / (knots[knot + KNOT + SQUARE] - from);
    const ahead = x * middleC + y * middleS;
    const aside = Math.abs(y * middleC - x * middleS);
    let joint = 0;
    let least = Infinity;
    for (let side = knot; side <= knot + SIDE; side += SIDE) {
      if (knots[side + STATUS] === ABSENT) continue;
      const rest = knots[side + MISS] + t * (knots[side + KNOT + MISS] - knots[side + MISS]);
      const turn = edge === -2 ? 0 : Math.max(0, Math.atan2(aside, knots[side + FACING] * ahead) - halfRanges[0]);
      const by = Math.max(rest, turn);
      const named = turn >= rest ? 1 : knots[side + CLASS];
      if (Math.abs(turn - rest) < TIE || (named !== joint && Math.abs(by - least) < TIE)) return CANNOT_TELL;
      if (by < least) {
        least = by;
        joint = named;
      }
    }
    return joint;
  };
}
