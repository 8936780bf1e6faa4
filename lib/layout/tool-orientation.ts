import { orient } from '@/lib/kinematics/target';
import { identityTransform, type Transform } from '@/lib/kinematics/transforms';
import type { Frame, Vec3 } from '@/lib/kinematics/types';

/** Directions and rolls of a tool, as the sheet writes them and as the kernel takes them. */

/**
 * Where a tool points (unit length): straight down at tilt 0, level at 90, straight up at 180; azimuth is the heading it
 * tilts to. Exact at the right angles, which are the usual ones, so that equal questions stay equal.
 */
export function toolDirection(tiltDeg: number, azimuthDeg: number): [number, number, number] {
  const side = sineDeg(tiltDeg);
  return [side * cosineDeg(azimuthDeg), side * sineDeg(azimuthDeg), -cosineDeg(tiltDeg)];
}

function sineDeg(angleDeg: number): number {
  const quarter = angleDeg / 90;
  return Number.isInteger(quarter) ? [0, 1, 0, -1][((quarter % 4) + 4) % 4] : Math.sin((angleDeg * Math.PI) / 180);
}

function cosineDeg(angleDeg: number): number {
  return sineDeg(angleDeg + 90);
}

/** The tool's axes for a direction and a roll (rad); the place is left at the origin. */
export function toolOrientation(direction: Vec3, rollRad: number): Transform {
  return orient(direction, rollRad, identityTransform());
}

/** The roll (rad, −π … π) that `toolOrientation` would need for these axes. */
export function rollOf(axes: Transform): number {
  const unrolled = toolOrientation([axes[2], axes[6], axes[10]], 0);
  const along = (column: 0 | 1): number =>
    axes[0] * unrolled[column] + axes[4] * unrolled[4 + column] + axes[8] * unrolled[8 + column];
  return Math.atan2(along(1), along(0));
}

/** Cosine of the pitch below which the sines that tell roll from yaw are rounding noise. */
const UPRIGHT = 1e-9;

/**
 * An offset and a rotation about the fixed x, then y, then z axis (m, rad). The pitch is within ±90°; where it is ±90° roll
 * and yaw turn about one axis, and the roll is 0.
 */
export function frameOf(transform: Transform): Frame {
  const t = transform;
  const xyz: Vec3 = [t[3], t[7], t[11]];
  const level = Math.hypot(t[0], t[4]);
  const pitch = Math.atan2(-t[8], level);
  if (level < UPRIGHT) return { xyz, rpy: [0, pitch, Math.atan2(-t[1], t[5])] };
  return { xyz, rpy: [Math.atan2(t[9], t[10]), pitch, Math.atan2(t[4], t[0])] };
}

/** The tool's own x and y axes (unit length) at a tilt, an azimuth and a roll; a free roll is taken as 0. */
export function toolAxes(held: {
  readonly tiltDeg: number;
  readonly azimuthDeg: number;
  readonly rollDeg: number | 'free';
}): { readonly x: Vec3; readonly y: Vec3 } {
  const roll = held.rollDeg === 'free' ? 0 : (held.rollDeg * Math.PI) / 180;
  const t = toolOrientation(toolDirection(held.tiltDeg, held.azimuthDeg), roll);
  return { x: [t[0], t[4], t[8]], y: [t[1], t[5], t[9]] };
}
