import { identityTransform, multiplyTransforms, transformOf, type Transform } from './transforms';
import type { Arm } from './types';

/** An arm compiled once into flat numbers, so that the loops over poses touch no objects. */
export interface Chain {
  /** Chain joints, and actuators (the two differ only under a coupling). */
  readonly joints: number;
  readonly actuators: number;
  readonly modified: boolean;
  readonly prismatic: Uint8Array;
  readonly a: Float64Array;
  readonly d: Float64Array;
  readonly theta: Float64Array;
  readonly cosAlpha: Float64Array;
  readonly sinAlpha: Float64Array;
  readonly base: Transform;
  readonly tool: Transform;
  /** Chain joints × actuators, row after row; null when each joint is its own actuator. */
  readonly coupling: Float64Array | null;
  /** Limits of the chain joints. */
  readonly jointMin: Float64Array;
  readonly jointMax: Float64Array;
  /** 1 for actuators of which a whole turn leaves the chain standing as it stood. */
  readonly wholeTurns: Uint8Array;
  /** Limits, speeds and accelerations of the actuators. */
  readonly min: Float64Array;
  readonly max: Float64Array;
  readonly maxSpeed: Float64Array;
  readonly maxAcceleration: Float64Array;
}

export function compileChain(arm: Arm): Chain {
  const { joints } = arm;
  const driven = arm.actuators ?? joints;
  const numbers = <T>(rows: readonly T[], pick: (row: T) => number) => Float64Array.from(rows, pick);
  return {
    joints: joints.length,
    actuators: arm.coupling ? arm.coupling[0].length : joints.length,
    modified: arm.convention === 'modified',
    prismatic: Uint8Array.from(joints, (joint) => (joint.type === 'prismatic' ? 1 : 0)),
    a: numbers(joints, (joint) => joint.a),
    d: numbers(joints, (joint) => joint.d),
    theta: numbers(joints, (joint) => joint.theta),
    cosAlpha: numbers(joints, (joint) => exactCosine(joint.alpha)),
    sinAlpha: numbers(joints, (joint) => exactCosine(joint.alpha - Math.PI / 2)),
    base: transformOf(arm.base),
    tool: transformOf(arm.tool),
    coupling: arm.coupling ? Float64Array.from(arm.coupling.flat()) : null,
    jointMin: numbers(joints, (joint) => joint.min),
    jointMax: numbers(joints, (joint) => joint.max),
    wholeTurns: Uint8Array.from(driven, (_, k) => (turnsWholly(arm, k) ? 1 : 0)),
    min: numbers(driven, (row) => row.min),
    max: numbers(driven, (row) => row.max),
    maxSpeed: numbers(driven, (row) => row.maxSpeed),
    maxAcceleration: numbers(driven, (row) => row.maxAcceleration),
  };
}

function turnsWholly({ joints, coupling }: Arm, actuator: number): boolean {
  if (!coupling) return joints[actuator].type === 'revolute';
  return joints.every(({ type }, j) => {
    const share = coupling[j][actuator];
    return share === 0 || (type === 'revolute' && Number.isInteger(share));
  });
}

/** A twist of 90° typed as π/2 has a cosine of 6e-17; it means a right angle, and zero keeps parallel axes parallel. */
function exactCosine(angle: number): number {
  const cosine = Math.cos(angle);
  return Math.abs(cosine) < 1e-15 ? 0 : cosine;
}

/** Chain joint values (rad, m) from actuator values: q = C u. */
export function jointsOfActuators(chain: Chain, actuators: ArrayLike<number>, out: Float64Array): Float64Array {
  if (!chain.coupling) {
    for (let i = 0; i < chain.joints; i++) out[i] = actuators[i];
    return out;
  }
  for (let i = 0; i < chain.joints; i++) {
    let sum = 0;
    for (let k = 0; k < chain.actuators; k++) sum += chain.coupling[i * chain.actuators + k] * actuators[k];
    out[i] = sum;
  }
  return out;
}

/**
 * Where a chain stands in one posture. `axes` and `origins` hold joint i's axis and a point on it at 3 i … 3 i + 2, in the frame that the
 * base is given in; `frames` the transform behind each joint; `tool` the tool point.
 */
export interface Stance {
  readonly axes: Float64Array;
  readonly origins: Float64Array;
  readonly tool: Transform;
  readonly flange: Transform;
  readonly joints: Float64Array;
}

export function makeStance(chain: Chain): Stance {
  return {
    axes: new Float64Array(3 * chain.joints),
    origins: new Float64Array(3 * chain.joints),
    tool: identityTransform(),
    flange: identityTransform(),
    joints: new Float64Array(chain.joints),
  };
}

/** Forward kinematics by Denavit-Hartenberg rows (Denavit & Hartenberg 1955; Craig's modified rows). */
export function forward(chain: Chain, actuators: ArrayLike<number>, stance: Stance): Stance {
  const q = jointsOfActuators(chain, actuators, stance.joints);
  const t = stance.flange;
  t.set(chain.base);
  for (let i = 0; i < chain.joints; i++) {
    if (chain.modified) twist(t, chain.a[i], chain.cosAlpha[i], chain.sinAlpha[i]);
    stance.axes[3 * i] = t[2];
    stance.axes[3 * i + 1] = t[6];
    stance.axes[3 * i + 2] = t[10];
    stance.origins[3 * i] = t[3];
    stance.origins[3 * i + 1] = t[7];
    stance.origins[3 * i + 2] = t[11];
    if (chain.prismatic[i]) spin(t, chain.theta[i], chain.d[i] + q[i]);
    else spin(t, chain.theta[i] + q[i], chain.d[i]);
    if (!chain.modified) twist(t, chain.a[i], chain.cosAlpha[i], chain.sinAlpha[i]);
  }
  multiplyTransforms(t, chain.tool, stance.tool);
  return stance;
}

/** t ← t · Rz(angle) · Tz(shift) */
function spin(t: Transform, angle: number, shift: number) {
  const c = Math.cos(angle);
  const s = Math.sin(angle);
  for (let row = 0; row < 12; row += 4) {
    const x = t[row];
    const y = t[row + 1];
    t[row] = x * c + y * s;
    t[row + 1] = y * c - x * s;
    t[row + 3] += t[row + 2] * shift;
  }
}

/** t ← t · Tx(length) · Rx(angle) */
function twist(t: Transform, length: number, c: number, s: number) {
  for (let row = 0; row < 12; row += 4) {
    const y = t[row + 1];
    const z = t[row + 2];
    t[row + 3] += t[row] * length;
    t[row + 1] = y * c + z * s;
    t[row + 2] = z * c - y * s;
  }
}

/**
 * Geometric Jacobian of the tool point, 6 × actuators, row after row (linear m, angular rad, per rad or m of the actuator).
 * `scratch` holds 6 × joints numbers and is only used under a coupling.
 */
export function jacobian(chain: Chain, stance: Stance, out: Float64Array, scratch?: Float64Array): Float64Array {
  const n = chain.joints;
  const target = chain.coupling ? (scratch ?? new Float64Array(6 * n)) : out;
  const px = stance.tool[3];
  const py = stance.tool[7];
  const pz = stance.tool[11];
  for (let i = 0; i < n; i++) {
    const zx = stance.axes[3 * i];
    const zy = stance.axes[3 * i + 1];
    const zz = stance.axes[3 * i + 2];
    if (chain.prismatic[i]) {
      target[i] = zx;
      target[n + i] = zy;
      target[2 * n + i] = zz;
      target[3 * n + i] = target[4 * n + i] = target[5 * n + i] = 0;
      continue;
    }
    const rx = px - stance.origins[3 * i];
    const ry = py - stance.origins[3 * i + 1];
    const rz = pz - stance.origins[3 * i + 2];
    target[i] = zy * rz - zz * ry;
    target[n + i] = zz * rx - zx * rz;
    target[2 * n + i] = zx * ry - zy * rx;
    target[3 * n + i] = zx;
    target[4 * n + i] = zy;
    target[5 * n + i] = zz;
  }
  if (chain.coupling) {
    for (let row = 0; row < 6; row++)
      for (let k = 0; k < chain.actuators; k++) {
        let sum = 0;
        for (let i = 0; i < n; i++) sum += target[row * n + i] * chain.coupling[i * chain.actuators + k];
        out[row * chain.actuators + k] = sum;
      }
  }
  return out;
}

/** The sticks to draw: base, each joint's origin, flange and tool point, as [x, y, z] in m. */
export function skeleton(chain: Chain, actuators: ArrayLike<number>): [number, number, number][] {
  const stance = forward(chain, actuators, makeStance(chain));
  const at = (t: Transform): [number, number, number] => [t[3], t[7], t[11]];
  const points: [number, number, number][] = [at(chain.base)];
  for (let i = 0; i < chain.joints; i++)
    points.push([stance.origins[3 * i], stance.origins[3 * i + 1], stance.origins[3 * i + 2]]);
  points.push(at(stance.flange), at(stance.tool));
  return points;
}
