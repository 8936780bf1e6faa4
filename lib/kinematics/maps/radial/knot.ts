import { DOUBTFUL, C1, C4, FLIPPED, PAIR, PLAIN, SIXTH, TOO_FAR } from '../../fast/branch-pairs';
import { makeLimitMargins } from '../../fast/limit-margins';
import { JOINT, makeLimitOffsets, MISS as MISSED, SHARE } from '../../fast/limit-offsets';
import { ICN, makeSixAxisGauge, MAXIMUM_SPEED, SURE_SPEED } from '../../fast/six-axis-gauge';
import { WRIST_FLIPPED } from '../../inverse/spherical-wrist';
import { CLEARLY_BETTER, CODE } from '../cell';
import type { Symmetry } from './symmetry';

/**
 * All that a map knows of one radius: what the best branch of either shoulder side is worth, joint 1 left out of account. Offsets of one side, the
 * second one SIDE numbers on; then what belongs to the radius as a whole.
 */
export const SIDE = 11;
/** ABSENT, INSIDE or OUTSIDE; class of branch, or where outside the joint (from one) that binds; ±1: joint 1 faces the spot or has it behind. */
export const STATUS = 0;
export const CLASS = 1;
export const FACING = 2;
export const VALUE = 3;
export const MAXIMUM = 4;
export const SURE = 5;
/** Least share of range left to joints 2 to 5, then by how much they miss their limits (rad). */
export const REST = 6;
export const MISS = 7;
/** Cosine and sine of joint 6, counted from mid-range, at bearing zero. */
export const C6 = 8;
export const S6 = 9;
/** By how much the best class leads the second of its side; 1 where there is none. */
export const LEAD = 10;
/** How far each of the eight classes stands inside its limits. */
export const MARGINS = 2 * SIDE;
/** By how much one side leads the other. */
export const SIDES_LEAD = MARGINS + 8;
/** Shoulder side to take first; reason where both are absent; and all that is discrete in one number, −1 where doubtful. */
export const FIRST = SIDES_LEAD + 1;
export const REASON = FIRST + 1;
export const SIGNATURE = REASON + 1;
export const SQUARE = SIGNATURE + 1;
export const KNOT = SQUARE + 1;

export const ABSENT = 0;
export const INSIDE = 1;
export const OUTSIDE = 2;

/** Reads the radius whose square stands at `at + SQUARE` into the KNOT numbers from `at` on. */
export type KnotReader = (out: Float64Array, at: number) => void;

export function makeKnotReader(symmetry: Symmetry): KnotReader {
  const { chain, wrist, wanted, lastIsFree, pose, heading } = symmetry;
  const anyFirst = { ...chain, min: chain.min.slice(), max: chain.max.slice() };
  anyFirst.min[0] = -Math.PI;
  anyFirst.max[0] = Math.PI;
  const gauge = makeSixAxisGauge(anyFirst, wrist, true)!;
  const { branches, reading } = gauge;
  const { codes, inside, pairs, shared, windows } = branches;
  branches.orient(pose);
  const margins = new Float64Array(2);
  const readMargins = makeLimitMargins(branches, margins);
  const offsets = makeLimitOffsets(branches, chain);
  const { answers } = offsets;
  const asked = (code: number) => wanted < 0 || wanted === code;

  return (out, at) => {
    const radius = Math.sqrt(out[at + SQUARE]);
    pose[3] = heading[0] + radius * heading[3];
    pose[7] = heading[1] + radius * heading[4];
    pose[11] = heading[2];
    const count = branches.solve(pose);
    for (let k = 0; k < SQUARE; k++) out[at + k] = 0;
    out[at + LEAD] = out[at + SIDE + LEAD] = out[at + SIDES_LEAD] = 1;
    for (let code = 0; code < 8; code++) out[at + MARGINS + code] = 1;
    if (count === DOUBTFUL) {
      out[at + SIGNATURE] = -1;
      return;
    }
    out[at + REASON] = count < 0 ? CODE[count === TOO_FAR ? 'too far' : 'too near'] : CODE['not found'];
    let signature = out[at + REASON];
    for (let pair = 0; pair < count; pair++) {
      const plain = codes[pair];
      readMargins(pair);
      out[at + MARGINS + plain] = asked(plain) ? margins[0] : 1;
      out[at + MARGINS + (plain | WRIST_FLIPPED)] = asked(plain | WRIST_FLIPPED) ? margins[1] : 1;
      // Where the wrist passes through straight, joint 4 turns over at once.
      signature = 8 * signature + 2 * inside[pair] + (pairs[pair * PAIR + C4] > 0 ? 1 : 0);
      judge(pair, out, at + (plain & 1) * SIDE);
    }
    const [left, right] = [out[at + VALUE], out[at + SIDE + VALUE]];
    const both = out[at + STATUS] === INSIDE && out[at + SIDE + STATUS] === INSIDE;
    const second = out[at + STATUS] !== INSIDE || (both && right > left + CLEARLY_BETTER);
    out[at + FIRST] = second ? 1 : 0;
    if (both && Math.abs(right - left) > CLEARLY_BETTER) out[at + SIDES_LEAD] = right - left;
    for (let side = at; side <= at + SIDE; side += SIDE)
      signature = 128 * signature + 32 * (out[side + FACING] + 1) + 9 * out[side + STATUS] + out[side + CLASS];
    out[at + SIGNATURE] = 2 * signature + out[at + FIRST];
  };

  function judge(pair: number, out: Float64Array, side: number) {
    const plain = codes[pair];
    const takesPlain = asked(plain);
    const takesFlipped = asked(plain | WRIST_FLIPPED);
    if (!takesPlain && !takesFlipped) return;
    out[side + FACING] = pairs[pair * PAIR + C1] > 0 ? 1 : -1;
    const plainInside = takesPlain && (inside[pair] & PLAIN) !== 0;
    if (!plainInside && !(takesFlipped && inside[pair] & FLIPPED)) {
      if (out[side + STATUS] !== INSIDE) noteMisses(pair, takesPlain, takesFlipped, out, side);
      return;
    }
    gauge.read(pair);
    const value = reading[ICN];
    if (out[side + STATUS] === INSIDE) {
      const lead = Math.abs(value - out[side + VALUE]);
      if (lead > CLEARLY_BETTER) out[side + LEAD] = lead;
      if (value <= out[side + VALUE] + CLEARLY_BETTER) return;
    }
    gauge.readSpeeds();
    offsets.read(pair, !plainInside, 1, 5);
    out[side + STATUS] = INSIDE;
    out[side + CLASS] = plainInside ? plain : plain | WRIST_FLIPPED;
    out[side + VALUE] = value;
    out[side + MAXIMUM] = reading[MAXIMUM_SPEED];
    out[side + SURE] = reading[SURE_SPEED];
    out[side + REST] = answers[SHARE];
    out[side + MISS] = 0;
    if (lastIsFree) return;
    branches.fillSixth(pair);
    const sign = plainInside ? 1 : -1;
    const c = sign * shared[SIXTH];
    const s = sign * shared[SIXTH + 1];
    out[side + C6] = c * windows[10] + s * windows[11];
    out[side + S6] = s * windows[10] - c * windows[11];
  }

  function noteMisses(pair: number, plain: boolean, flipped: boolean, out: Float64Array, side: number) {
    for (let flip = plain ? 0 : 1; flip < (flipped ? 2 : 1); flip++) {
      offsets.read(pair, flip === 1, 1, 5);
      if (out[side + STATUS] === OUTSIDE && answers[MISSED] >= out[side + MISS]) continue;
      out[side + STATUS] = OUTSIDE;
      out[side + MISS] = answers[MISSED];
      out[side + CLASS] = answers[JOINT];
    }
  }
}
