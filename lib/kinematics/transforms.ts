import type { Frame, Pose } from './types';

/**
 * Rigid transforms as 12 numbers: the upper three rows of the 4 × 4 matrix, row after row. In-place and allocation-free, since
 * the map loops run through here.
 */
export type Transform = Float64Array;

export function identityTransform(): Transform {
  return Float64Array.of(1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0);
}

/** Rotation about fixed x, then y, then z (rad), then the offset (m). */
export function transformOf(frame: Frame | undefined): Transform {
  if (!frame) return identityTransform();
  const [rx, ry, rz] = frame.rpy;
  const [x, y, z] = frame.xyz;
  const cx = Math.cos(rx);
  const sx = Math.sin(rx);
  const cy = Math.cos(ry);
  const sy = Math.sin(ry);
  const cz = Math.cos(rz);
  const sz = Math.sin(rz);
  return Float64Array.of(
    cz * cy,
    cz * sy * sx - sz * cx,
    cz * sy * cx + sz * sx,
    x,
    sz * cy,
    sz * sy * sx + cz * cx,
    sz * sy * cx - cz * sx,
    y,
    -sy,
    cy * sx,
    cy * cx,
    z,
  );
}

/** out = left · right; `out` may be either of them. */
export function multiplyTransforms(left: Transform, right: Transform, out: Transform): Transform {
  const r0 = right[0],
    r1 = right[1],
    r2 = right[2],
    r3 = right[3];
  const r4 = right[4],
    r5 = right[5],
    r6 = right[6],
    r7 = right[7];
  const r8 = right[8],
    r9 = right[9],
    r10 = right[10],
    r11 = right[11];
  for (let row = 0; row < 12; row += 4) {
    const a = left[row],
      b = left[row + 1],
      c = left[row + 2],
      d = left[row + 3];
    out[row] = a * r0 + b * r4 + c * r8;
    out[row + 1] = a * r1 + b * r5 + c * r9;
    out[row + 2] = a * r2 + b * r6 + c * r10;
    out[row + 3] = a * r3 + b * r7 + c * r11 + d;
  }
  return out;
}

export function invertTransform(transform: Transform, out: Transform): Transform {
  const t = transform;
  const x = t[3],
    y = t[7],
    z = t[11];
  const [a, b, c, d, e, f, g, h, i] = [t[0], t[4], t[8], t[1], t[5], t[9], t[2], t[6], t[10]];
  out[0] = a;
  out[1] = b;
  out[2] = c;
  out[3] = -(a * x + b * y + c * z);
  out[4] = d;
  out[5] = e;
  out[6] = f;
  out[7] = -(d * x + e * y + f * z);
  out[8] = g;
  out[9] = h;
  out[10] = i;
  out[11] = -(g * x + h * y + i * z);
  return out;
}

export function poseOf(transform: Transform): Pose {
  const row = (start: number) => Array.from(transform.subarray(start, start + 4));
  return [row(0), row(4), row(8), [0, 0, 0, 1]];
}

export function transformOfPose(pose: Pose): Transform {
  return Float64Array.of(...pose[0], ...pose[1], ...pose[2]);
}

/** Angle (rad) of the rotation that leads from one orientation to the other; exact near zero and near a half turn. */
export function rotationDistance(left: Transform, right: Transform): number {
  // r = leftᵀ · right; its skew part has length 2 sin, its trace is 1 + 2 cos.
  const r = (i: number, j: number) => left[i] * right[j] + left[4 + i] * right[4 + j] + left[8 + i] * right[8 + j];
  const sine = Math.hypot(r(2, 1) - r(1, 2), r(0, 2) - r(2, 0), r(1, 0) - r(0, 1));
  return Math.atan2(sine, r(0, 0) + r(1, 1) + r(2, 2) - 1);
}

export function pointDistance(left: Transform, right: Transform): number {
  return Math.hypot(left[3] - right[3], left[7] - right[7], left[11] - right[11]);
}
