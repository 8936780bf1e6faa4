import {
  ABSENT,
  C6,
  CLASS,
  FACING,
  FIRST,
  INSIDE,
  KNOT,
  MAXIMUM,
  REASON,
  REST,
  S6,
  SIDE,
  SQUARE,
  STATUS,
  SURE,
  VALUE,
} from './knot';
import type { Profile } from './profile';
import type { Symmetry } from './symmetry';

/** A profile laid out for filling cells: of each piece what kind it is, and straight lines in the squared radius for the sides that reach. */
export interface Pieces {
  readonly profile: Profile;
  /** CHANGING, SHORT, REACHING or BEYOND_LIMITS. */
  readonly kinds: Uint8Array;
  /** Reason where SHORT. */
  readonly reasons: Uint8Array;
  /** Two slots a piece, the side to take first in front. */
  readonly slots: Float64Array;
  /** The piece of a squared radius is found from here upwards; see `pieceAt`. */
  readonly starts: Uint16Array;
  readonly ends: Float64Array;
  readonly perBucket: number;
}

export const CHANGING = 0;
export const SHORT = 1;
export const REACHING = 2;
export const BEYOND_LIMITS = 3;

export const SLOT = 13;
/** ±1, 0 where this side does not reach; class of branch. */
export const SLOT_FACING = 0;
export const SLOT_CLASS = 1;
/** Start and slope of each line: value, maximum, sure, rest of the range. */
export const SLOT_LINES = 2;
/** Cosine of joint 1's distance from mid-range up to which joints 2 to 5 are nearer to their limits. */
export const SLOT_GUARD = 10;
export const SLOT_C6 = 11;
export const SLOT_S6 = 12;

const LINES = [VALUE, MAXIMUM, SURE, REST];
const BUCKETS = 2048;

export function makePieces(profile: Profile, { halfRanges }: Symmetry): Pieces {
  const { knots, pieces, changes } = profile;
  const kinds = new Uint8Array(pieces);
  const reasons = new Uint8Array(pieces);
  const slots = new Float64Array(2 * SLOT * pieces);
  const ends = new Float64Array(pieces);
  for (let piece = 0; piece < pieces; piece++) {
    const knot = piece * KNOT;
    const left = knots[knot + STATUS];
    const right = knots[knot + SIDE + STATUS];
    ends[piece] = knots[knot + KNOT + SQUARE];
    reasons[piece] = knots[knot + REASON];
    if (changes[piece] === 1) kinds[piece] = CHANGING;
    else if (left === ABSENT && right === ABSENT) kinds[piece] = SHORT;
    else kinds[piece] = left === INSIDE || right === INSIDE ? REACHING : BEYOND_LIMITS;
    const first = knots[knot + FIRST];
    fillSlot(knot + first * SIDE, 2 * SLOT * piece);
    fillSlot(knot + (1 - first) * SIDE, (2 * piece + 1) * SLOT);
  }

  function fillSlot(side: number, slot: number) {
    if (knots[side + STATUS] !== INSIDE) return;
    const knot = side - (side % KNOT);
    const from = knots[knot + SQUARE];
    const width = knots[knot + KNOT + SQUARE] - from;
    slots[slot + SLOT_FACING] = knots[side + FACING];
    slots[slot + SLOT_CLASS] = knots[side + CLASS];
    LINES.forEach((offset, line) => {
      const slope = (knots[side + KNOT + offset] - knots[side + offset]) / width;
      slots[slot + SLOT_LINES + 2 * line] = knots[side + offset] - slope * from;
      slots[slot + SLOT_LINES + 2 * line + 1] = slope;
    });
    const most = Math.max(knots[side + REST], knots[side + KNOT + REST]);
    slots[slot + SLOT_GUARD] = Math.cos(Math.min(Math.PI, (1 - 2 * most) * halfRanges[0]));
    slots[slot + SLOT_C6] = knots[side + C6];
    slots[slot + SLOT_S6] = knots[side + S6];
  }

  const perBucket = BUCKETS / ends[pieces - 1];
  const starts = new Uint16Array(BUCKETS + 1);
  for (let bucket = 0, piece = 0; bucket <= BUCKETS; bucket++) {
    while (piece < pieces - 1 && ends[piece] * perBucket <= bucket) piece++;
    starts[bucket] = piece;
  }
  return { profile, kinds, reasons, slots, starts, ends, perBucket };
}
