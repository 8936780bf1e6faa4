/** Vectors for closed forms: three numbers each, results written in place, so that maps cost no memory per cell. */
export type Vector = Float64Array;

export const dotOf = (a: ArrayLike<number>, b: ArrayLike<number>): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];

export function cross(a: ArrayLike<number>, b: ArrayLike<number>, out: Vector) {
  const x = a[1] * b[2] - a[2] * b[1];
  const y = a[2] * b[0] - a[0] * b[2];
  out[2] = a[0] * b[1] - a[1] * b[0];
  out[0] = x;
  out[1] = y;
}

/** out = a + t b */
export function addScaled(a: ArrayLike<number>, b: ArrayLike<number>, t: number, out: Vector) {
  out[0] = a[0] + t * b[0];
  out[1] = a[1] + t * b[1];
  out[2] = a[2] + t * b[2];
}

/** Scales to length one; answers the length that it had. */
export function toUnit(v: Vector): number {
  const size = Math.sqrt(dotOf(v, v));
  v[0] /= size;
  v[1] /= size;
  v[2] /= size;
  return size;
}

/** v turned about a unit axis, cosine and sine of the angle given (Rodrigues' formula). */
export function turn(v: ArrayLike<number>, axis: ArrayLike<number>, c: number, s: number, out: Vector) {
  const x = v[0];
  const y = v[1];
  const z = v[2];
  const share = (axis[0] * x + axis[1] * y + axis[2] * z) * (1 - c);
  out[0] = c * x + s * (axis[1] * z - axis[2] * y) + share * axis[0];
  out[1] = c * y + s * (axis[2] * x - axis[0] * z) + share * axis[1];
  out[2] = c * z + s * (axis[0] * y - axis[1] * x) + share * axis[2];
}

/** Where a point that is given in the flange stands for a flange pose (row after row, 3 × 4 or more). */
export function placeInFlange(flange: ArrayLike<number>, point: ArrayLike<number>, out: Vector) {
  for (let row = 0; row < 3; row++) {
    const at = 4 * row;
    out[row] = flange[at] * point[0] + flange[at + 1] * point[1] + flange[at + 2] * point[2] + flange[at + 3];
  }
}
