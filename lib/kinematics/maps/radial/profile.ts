import {
  C6,
  INSIDE,
  KNOT,
  LEAD,
  makeKnotReader,
  MARGINS,
  MAXIMUM,
  MISS,
  REST,
  S6,
  SIDE,
  SIDES_LEAD,
  SIGNATURE,
  SQUARE,
  STATUS,
  SURE,
  VALUE,
} from './knot';
import type { Symmetry } from './symmetry';

/** The radii of a map cut into pieces within which nothing jumps and straight lines in the squared radius come close enough. */
export interface Profile {
  /** KNOT numbers a radius, ascending; piece i lies between knots i and i + 1. */
  readonly knots: Float64Array;
  readonly pieces: number;
  /** 1 where a limit, a shortfall or the lead of a branch changes within the piece, or a value is too steep: its few cells are judged one by one. */
  readonly changes: Uint8Array;
}

/** Even pieces at the start, within the arm's reach; each is halved until it fits. */
const START = 48;
/**
 * Largest error of a straight line at the middle of a piece, as a share of the scale. The piece is then kept as two halves, whose
 * own error is a quarter of it where the curve is smooth.
 */
const FIT = 5e-4;
/** rad; decides only which of two joints is named. */
const MISS_FIT = 1e-3;

/** `farthest`: radius up to which it is needed (m); `finest`: width (m) below which a piece is not halved. */
export function makeProfile(symmetry: Symmetry, farthest: number, finest: number): Profile {
  const read = makeKnotReader(symmetry);
  const room = new Growing();
  const readAt = (square: number): number => {
    const at = room.next();
    room.knots[at + SQUARE] = square;
    read(room.knots, at);
    return at;
  };
  /** Offsets of knots from inside to outside, and of the pieces behind them. */
  const order: number[] = [];
  const changes: number[] = [];
  const keep = (from: number, change: number) => {
    order.push(from);
    changes.push(change);
  };

  const start: number[] = [];
  const inner = Math.min(farthest, symmetry.reach);
  for (let k = 0; k <= START; k++) start.push(readAt(((inner * k) / START) ** 2));
  if (farthest > inner) start.push(readAt(farthest ** 2));
  const scales = [VALUE, MAXIMUM, SURE, REST].map((offset) => {
    let most = 0;
    for (const at of start)
      for (let side = at; side <= at + SIDE; side += SIDE) most = Math.max(most, room.knots[side + offset]);
    return offset === VALUE ? 1 : most;
  });

  function split(left: number, right: number) {
    const { knots } = room;
    const from = knots[left + SQUARE];
    const to = knots[right + SQUARE];
    const same = knots[left + SIGNATURE] === knots[right + SIGNATURE] && knots[left + SIGNATURE] !== -1;
    if (Math.sqrt(to) - Math.sqrt(from) < finest) return keep(left, 1);
    const half = ((Math.sqrt(from) + Math.sqrt(to)) / 2) ** 2;
    const middle = readAt(half);
    if (same && fits(room.knots, left, middle, right, scales)) {
      keep(left, 0);
      keep(middle, 0);
      return;
    }
    split(left, middle);
    split(middle, right);
  }

  for (let k = 1; k < start.length; k++) split(start[k - 1], start[k]);
  order.push(start[start.length - 1]);
  const knots = new Float64Array(order.length * KNOT);
  order.forEach((at, i) => knots.set(room.knots.subarray(at, at + KNOT), i * KNOT));
  return { knots, pieces: changes.length, changes: Uint8Array.from(changes) };
}

function fits(k: Float64Array, left: number, middle: number, right: number, scales: readonly number[]): boolean {
  if (k[middle + SIGNATURE] !== k[left + SIGNATURE]) return false;
  const t = (k[middle + SQUARE] - k[left + SQUARE]) / (k[right + SQUARE] - k[left + SQUARE]);
  const bend = (offset: number) =>
    Math.abs(k[middle + offset] - k[left + offset] - t * (k[right + offset] - k[left + offset]));
  // Something that is near zero and bends may touch zero in between, unseen at the three knots.
  const mayCross = (offset: number) =>
    Math.min(Math.abs(k[left + offset]), Math.abs(k[middle + offset]), Math.abs(k[right + offset])) < 2 * bend(offset);
  for (let code = 0; code < 8; code++) if (mayCross(MARGINS + code)) return false;
  if (mayCross(SIDES_LEAD)) return false;
  for (let side = 0; side <= SIDE; side += SIDE) {
    if (mayCross(side + LEAD)) return false;
    if (k[left + side + STATUS] !== INSIDE) {
      if (bend(side + MISS) > MISS_FIT) return false;
      continue;
    }
    if (bend(side + VALUE) > FIT * scales[0] || bend(side + MAXIMUM) > FIT * scales[1]) return false;
    if (bend(side + SURE) > FIT * scales[2] || bend(side + REST) > FIT * scales[3]) return false;
    if (bend(side + C6) > FIT || bend(side + S6) > FIT) return false;
  }
  return true;
}

/** Knots one after another in an array that doubles when full. */
class Growing {
  knots = new Float64Array(512 * KNOT);
  private used = 0;

  next(): number {
    if ((this.used + 1) * KNOT > this.knots.length) {
      const larger = new Float64Array(2 * this.knots.length);
      larger.set(this.knots);
      this.knots = larger;
    }
    return this.used++ * KNOT;
  }
}
