import { identityTransform, pointDistance, type Transform } from '../transforms';

type Quaternion = readonly [w: number, x: number, y: number, z: number];

/** Unit quaternion of a rotation, by the largest of its four squares (Shepperd 1978), so that no digits are lost. */
function quaternionOf(t: Transform): Quaternion {
  const [a, b, c] = [t[0], t[5], t[10]];
  const squares = [1 + a + b + c, 1 + a - b - c, 1 - a + b - c, 1 - a - b + c];
  const largest = squares.indexOf(Math.max(...squares));
  const s = 2 * Math.sqrt(squares[largest]);
  const [x, y, z] = [t[9] - t[6], t[2] - t[8], t[4] - t[1]];
  const [xy, xz, yz] = [t[1] + t[4], t[2] + t[8], t[6] + t[9]];
  const of = (k: number): number => squares[k] / s;
  if (largest === 0) return [of(0), x / s, y / s, z / s];
  if (largest === 1) return [x / s, of(1), xy / s, xz / s];
  if (largest === 2) return [y / s, xy / s, of(2), yz / s];
  return [z / s, xz / s, yz / s, of(3)];
}

function writeRotation([w, x, y, z]: Quaternion, out: Transform): void {
  out[0] = 1 - 2 * (y * y + z * z);
  out[1] = 2 * (x * y - w * z);
  out[2] = 2 * (x * z + w * y);
  out[4] = 2 * (x * y + w * z);
  out[5] = 1 - 2 * (x * x + z * z);
  out[6] = 2 * (y * z - w * x);
  out[8] = 2 * (x * z - w * y);
  out[9] = 2 * (y * z + w * x);
  out[10] = 1 - 2 * (x * x + y * y);
}

/** The shorter way between two orientations at an even rate (Shoemake 1985); `share` 0 … 1. Writes the rotation part. */
export function turnBetween(from: Transform, to: Transform, share: number, out: Transform): Transform {
  const one = quaternionOf(from);
  let other = quaternionOf(to);
  let dot = one[0] * other[0] + one[1] * other[1] + one[2] * other[2] + one[3] * other[3];
  if (dot < 0) {
    dot = -dot;
    other = [-other[0], -other[1], -other[2], -other[3]];
  }
  const sine = Math.sqrt(Math.max(0, 1 - dot * dot));
  const angle = Math.atan2(sine, dot);
  const [p, q] =
    sine < 1e-9 ? [1 - share, share] : [Math.sin((1 - share) * angle) / sine, Math.sin(share * angle) / sine];
  const mixed = one.map((value, i) => p * value + q * other[i]);
  const size = Math.hypot(...mixed);
  writeRotation(mixed.map((value) => value / size) as unknown as Quaternion, out);
  return out;
}

/** A straight stretch as poses with their lengths along it; both ends included. m and rad. */
export interface PosedLine {
  readonly poses: Transform[];
  readonly atM: number[];
}

/** How much a tool that turns on the spot counts as length (m/rad), so that a mere turn has samples and a time too. */
export const TURN_LENGTH = 0.1;

/**
 * Poses from one to another along a straight line, the orientation turning evenly. Samples at most `stepM` apart; a turn counts as
 * `TURN_LENGTH` a radian where that is the longer way.
 */
export function straightPoses(from: Transform, to: Transform, stepM: number, turnRad: number): PosedLine {
  const length = Math.max(pointDistance(from, to), TURN_LENGTH * turnRad);
  const steps = Math.max(1, Math.ceil(length / stepM - 1e-9));
  const poses: Transform[] = [];
  const atM: number[] = [];
  for (let k = 0; k <= steps; k++) {
    const share = k / steps;
    const pose = turnBetween(from, to, share, identityTransform());
    for (const i of [3, 7, 11]) pose[i] = from[i] + (to[i] - from[i]) * share;
    poses.push(pose);
    atM.push(length * share);
  }
  return { poses, atM };
}
