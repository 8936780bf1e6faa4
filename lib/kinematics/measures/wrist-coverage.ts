import { reach } from '../reach';
import type { Solver } from '../solver';
import type { Vec3 } from '../types';

/** Which tool directions count: all of them, or those within an angle of an axis (rad, at most π). */
export type Directions =
  { readonly kind: 'sphere' } | { readonly kind: 'cone'; readonly axis: Vec3; readonly halfAngle: number };

export interface WristCoverage {
  /** Share of the directions that the tool can be held in at the point, any roll, 0 … 1. */
  readonly share: number;
  readonly directions: readonly Vec3[];
  /** 1 for each direction that is reached. */
  readonly reached: Uint8Array;
}

const GOLDEN_TURN = Math.PI * (3 - Math.sqrt(5));

/**
 * Even directions (unit vectors) by a Fibonacci lattice: the same area of the sphere for each. A cone's run in turns from its axis to its
 * rim.
 */
export function spreadDirections(of: Directions, count: number): Vec3[] {
  const [axis, halfAngle] = of.kind === 'sphere' ? [[0, 0, 1] as const, Math.PI] : [of.axis, of.halfAngle];
  const size = Math.hypot(...axis);
  if (!(size > 0) || !Number.isFinite(size)) throw new RangeError('The axis of a cone needs a direction.');
  if (!(halfAngle >= 0 && halfAngle <= Math.PI)) throw new RangeError('A cone opens by 0 to 180° from its axis.');
  const [zx, zy, zz] = axis.map((value) => value / size);
  // Two directions square to the axis (Duff et al. 2017).
  const sign = zz >= 0 ? 1 : -1;
  const a = -1 / (sign + zz);
  const b = zx * zy * a;
  const x: Vec3 = [1 + sign * zx * zx * a, sign * b, -sign * zx];
  const y: Vec3 = [b, sign + zy * zy * a, -zy];
  const height = 1 - Math.cos(halfAngle);
  return Array.from({ length: count }, (_, k): Vec3 => {
    const z = 1 - (height * (k + 0.5)) / count;
    const r = Math.sqrt(Math.max(0, 1 - z * z));
    const c = r * Math.cos(k * GOLDEN_TURN);
    const s = r * Math.sin(k * GOLDEN_TURN);
    return [c * x[0] + s * y[0] + z * zx, c * x[1] + s * y[1] + z * zy, c * x[2] + s * y[2] + z * zz];
  });
}

/** Share of tool directions that can be held at a point (Zacharias et al. 2007): `position` in m, in the frame that the base is given in. */
export function wristCoverage(solver: Solver, position: Vec3, of: Directions, count: number): WristCoverage {
  const directions = spreadDirections(of, count);
  const reached = Uint8Array.from(directions, (direction) =>
    reach(solver, { position, direction, roll: 'free' }).reached ? 1 : 0,
  );
  const share = count > 0 ? reached.reduce((sum, one) => sum + one, 0) / count : 0;
  return { share, directions, reached };
}
