import { identityTransform, transformOfPose, type Transform } from './transforms';
import type { Target, Vec3 } from './types';

/** Sine below which the direction counts as parallel to the frame's x axis. */
const PARALLEL = 1e-9;

/**
 * Orientation of a tool whose z axis points along `direction` (any length above zero). Roll 0 puts its x axis along the frame's x axis,
 * projected at right angles to the direction, or along the y axis where those are parallel. Writes the rotation part.
 */
export function orient(direction: Vec3, roll: number, out: Transform): Transform {
  const size = Math.hypot(direction[0], direction[1], direction[2]);
  const zx = direction[0] / size;
  const zy = direction[1] / size;
  const zz = direction[2] / size;
  // The x axis less its share along the direction; then y = z × x.
  let xx = 1 - zx * zx;
  let xy = -zx * zy;
  let xz = -zx * zz;
  if (xx < PARALLEL * PARALLEL) {
    xx = -zy * zx;
    xy = 1 - zy * zy;
    xz = -zy * zz;
  }
  const length = Math.sqrt(xx * xx + xy * xy + xz * xz);
  xx /= length;
  xy /= length;
  xz /= length;
  const yx = zy * xz - zz * xy;
  const yy = zz * xx - zx * xz;
  const yz = zx * xy - zy * xx;
  const c = Math.cos(roll);
  const s = Math.sin(roll);
  out[0] = c * xx + s * yx;
  out[4] = c * xy + s * yy;
  out[8] = c * xz + s * yz;
  out[1] = c * yx - s * xx;
  out[5] = c * yy - s * xy;
  out[9] = c * yz - s * xz;
  out[2] = zx;
  out[6] = zy;
  out[10] = zz;
  return out;
}

/** The pose asked for, with a free roll taken as zero; ask `rollOf` whether it is free. */
export function transformOfTarget(target: Target): Transform {
  if ('pose' in target) return transformOfPose(target.pose);
  const out = orient(target.direction, target.roll === 'free' ? 0 : target.roll, identityTransform());
  out[3] = target.position[0];
  out[7] = target.position[1];
  out[11] = target.position[2];
  return out;
}

export const hasFreeRoll = (target: Target): boolean => !('pose' in target) && target.roll === 'free';

/** out = transform turned by `roll` about its own z axis. */
export function rolled(transform: Transform, roll: number, out: Transform): Transform {
  const c = Math.cos(roll);
  const s = Math.sin(roll);
  for (let row = 0; row < 12; row += 4) {
    const x = transform[row];
    const y = transform[row + 1];
    out[row] = c * x + s * y;
    out[row + 1] = c * y - s * x;
    out[row + 2] = transform[row + 2];
    out[row + 3] = transform[row + 3];
  }
  return out;
}
