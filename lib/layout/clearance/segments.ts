/**
 * Distance (m) of two segments p → q and r → s in space; parallel ones and points included (after Ericson, Real-Time Collision
 * Detection, 2005, 5.1.9). Allocates nothing.
 */
export function segmentToSegment(
  px: number,
  py: number,
  pz: number,
  qx: number,
  qy: number,
  qz: number,
  rx: number,
  ry: number,
  rz: number,
  sx: number,
  sy: number,
  sz: number,
): number {
  // prettier-ignore
  const ux = qx - px;
  const uy = qy - py;
  const uz = qz - pz;
  const vx = sx - rx;
  const vy = sy - ry;
  const vz = sz - rz;
  const wx = px - rx;
  const wy = py - ry;
  const wz = pz - rz;
  const a = ux * ux + uy * uy + uz * uz;
  const e = vx * vx + vy * vy + vz * vz;
  const f = vx * wx + vy * wy + vz * wz;
  let s = 0;
  let t = 0;
  if (a > 0 && e > 0) {
    const c = ux * wx + uy * wy + uz * wz;
    const b = ux * vx + uy * vy + uz * vz;
    const denominator = a * e - b * b;
    s = denominator > 0 ? clamp((b * f - c * e) / denominator) : 0;
    t = (b * s + f) / e;
    if (t < 0) {
      t = 0;
      s = clamp(-c / a);
    } else if (t > 1) {
      t = 1;
      s = clamp((b - c) / a);
    }
  } else if (a > 0) {
    s = clamp(-(ux * wx + uy * wy + uz * wz) / a);
  } else if (e > 0) {
    t = clamp(f / e);
  }
  const dx = wx + s * ux - t * vx;
  const dy = wy + s * uy - t * vy;
  const dz = wz + s * uz - t * vz;
  return Math.sqrt(dx * dx + dy * dy + dz * dz);
}

const clamp = (value: number): number => (value < 0 ? 0 : value > 1 ? 1 : value);
