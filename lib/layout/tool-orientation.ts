import type { Frame, Vec3 } from '@/lib/kinematics/types';

/** Rotations as three rows, and the ways in which the sheet writes them. Radians. */
export type Matrix3 = readonly [Vec3, Vec3, Vec3];

/** Rotation about the fixed x, then y, then z axis: Rz · Ry · Rx. */
export function matrixOf([roll, pitch, yaw]: Vec3): Matrix3 {
  const [cr, sr] = [Math.cos(roll), Math.sin(roll)];
  const [cp, sp] = [Math.cos(pitch), Math.sin(pitch)];
  const [cy, sy] = [Math.cos(yaw), Math.sin(yaw)];
  return [
    [cy * cp, cy * sp * sr - sy * cr, cy * sp * cr + sy * sr],
    [sy * cp, sy * sp * sr + cy * cr, sy * sp * cr - cy * sr],
    [-sp, cp * sr, cp * cr],
  ];
}

/** The same back: the pitch is within ±90°; where it is ±90° roll and yaw turn about one axis, and the roll is 0. */
export function frameOf(xyz: Vec3, rotation: Matrix3): Frame {
  const [[xx], [yx], [zx, zy, zz]] = rotation;
  const level = Math.hypot(xx, yx);
  const pitch = Math.atan2(-zx, level);
  // Below this the sines that tell roll from yaw are rounding noise.
  if (level < 1e-9) return { xyz, rpy: [0, pitch, Math.atan2(-rotation[0][1], rotation[1][1])] };
  return { xyz, rpy: [Math.atan2(zy, zz), pitch, Math.atan2(yx, xx)] };
}

export function multiply(a: Matrix3, b: Matrix3): Matrix3 {
  const column = (index: 0 | 1 | 2): Vec3 => [b[0][index], b[1][index], b[2][index]];
  const [x, y, z] = [turn(a, column(0)), turn(a, column(1)), turn(a, column(2))];
  return [
    [x[0], y[0], z[0]],
    [x[1], y[1], z[1]],
    [x[2], y[2], z[2]],
  ];
}

export function turn(rotation: Matrix3, vector: Vec3): [number, number, number] {
  return [dot(rotation[0], vector), dot(rotation[1], vector), dot(rotation[2], vector)];
}

function dot(a: Vec3, b: Vec3): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}

function cross(a: Vec3, b: Vec3): [number, number, number] {
  return [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]];
}

function unit(vector: Vec3): [number, number, number] {
  const length = Math.hypot(...vector);
  return [vector[0] / length, vector[1] / length, vector[2] / length];
}

/**
 * Where a tool points: straight down at tilt 0, level at 90, straight up at 180; azimuth is the heading it tilts to.
 * Exact at the right angles, which are the usual ones, so that equal questions stay equal.
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

/** The axis that roll 0 turns the tool's x to: the frame's x at right angles to the direction, or its y where those are parallel. */
function rollReference(direction: Vec3): [number, number, number] {
  const across = (axis: Vec3): [number, number, number] => {
    const along = dot(axis, direction);
    return [axis[0] - along * direction[0], axis[1] - along * direction[1], axis[2] - along * direction[2]];
  };
  const x = across([1, 0, 0]);
  return unit(Math.hypot(...x) > PARALLEL ? x : across([0, 1, 0]));
}

/** Sine below which a direction counts as parallel to the frame's x axis. */
const PARALLEL = 1e-9;

/** The tool's axes as columns: z along `direction` (unit length), x turned by `rollRad` about it from the reference. */
export function toolRotation(direction: Vec3, rollRad: number): Matrix3 {
  const reference = rollReference(direction);
  const side = cross(direction, reference);
  const [c, s] = [Math.cos(rollRad), Math.sin(rollRad)];
  const x = reference.map((value, axis) => c * value + s * side[axis]) as [number, number, number];
  const y = cross(direction, x);
  return [
    [x[0], y[0], direction[0]],
    [x[1], y[1], direction[1]],
    [x[2], y[2], direction[2]],
  ];
}

/** The roll (rad, −π … π) that `toolRotation` would need for this rotation. */
export function rollOf(rotation: Matrix3): number {
  const direction: Vec3 = [rotation[0][2], rotation[1][2], rotation[2][2]];
  const x: Vec3 = [rotation[0][0], rotation[1][0], rotation[2][0]];
  const reference = rollReference(direction);
  return Math.atan2(dot(x, cross(direction, reference)), dot(x, reference));
}
