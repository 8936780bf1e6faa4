import { along, cross, dot, type Triple } from './lines';
import { wrapped } from './wrapped';

/** Cosine below which two axes count as at right angles. */
const SQUARE = 1e-9;
/** Sine of the middle angle below which the outer axes count as one line: the first turn is pinned and only the sum solved. */
const ALIGNED = 1e-10;

/** Three turns about axes through one point, each at right angles to the next: a shoulder or a wrist. */
export interface ThreeTurns {
  /** Solution k at 3 k, the middle angle positive first, then negative; overwritten by the next call. */
  readonly angles: Float64Array;
  /** `rotation`: nine numbers, row after row, that the turns have to make of the zero posture. Returns how many solutions there are (1 or 2). */
  solve(rotation: ArrayLike<number>): number;
}

/** `axes`: directions at the zero posture. Null where they are not at right angles. */
export function makeThreeTurns(axes: readonly Triple[]): ThreeTurns | null {
  const [first, middle, last] = axes;
  if (Math.abs(dot(first, middle)) > SQUARE || Math.abs(dot(middle, last)) > SQUARE) return null;
  const basis: Triple[] = [cross(middle, first), middle, first];
  const zero = Math.atan2(dot(last, basis[0]), dot(last, first));
  const c0 = Math.cos(zero);
  const s0 = Math.sin(zero);
  const none: Triple = [0, 0, 0];
  const turned = [
    along(along(none, basis[0], c0), basis[2], -s0),
    basis[1],
    along(along(none, basis[0], s0), basis[2], c0),
  ];
  const angles = new Float64Array(6);
  const m = new Float64Array(9);

  /** m = basisᵀ · rotation · basis · Ry(zero), which is Rz(first) · Ry(middle + zero) · Rz(last). */
  function toEuler(r: ArrayLike<number>) {
    for (let column = 0; column < 3; column++) {
      const v = turned[column];
      const x = r[0] * v[0] + r[1] * v[1] + r[2] * v[2];
      const y = r[3] * v[0] + r[4] * v[1] + r[5] * v[2];
      const z = r[6] * v[0] + r[7] * v[1] + r[8] * v[2];
      for (let row = 0; row < 3; row++) m[3 * row + column] = basis[row][0] * x + basis[row][1] * y + basis[row][2] * z;
    }
  }

  function put(at: number, one: number, two: number, three: number) {
    angles[at] = wrapped(one);
    angles[at + 1] = wrapped(two - zero);
    angles[at + 2] = wrapped(three);
  }

  function solve(rotation: ArrayLike<number>): number {
    toEuler(rotation);
    const sine = Math.hypot(m[2], m[5]);
    if (sine < ALIGNED) {
      const straight = m[8] > 0;
      put(0, 0, straight ? 0 : Math.PI, straight ? Math.atan2(m[3], m[0]) : Math.atan2(m[3], -m[0]));
      return 1;
    }
    const bend = Math.atan2(sine, m[8]);
    for (let flip = 0; flip < 2; flip++) {
      const one = flip === 0 ? Math.atan2(m[5], m[2]) : Math.atan2(-m[5], -m[2]);
      const c = Math.cos(one);
      const s = Math.sin(one);
      // Taken from what the first turn leaves over, so that near the aligned axes the errors of both cancel.
      put(3 * flip, one, flip === 0 ? bend : -bend, Math.atan2(c * m[3] - s * m[0], c * m[4] - s * m[1]));
    }
    return 2;
  }

  return { angles, solve };
}
