import type { Arm, Joint } from '../types';

const DEGREE = Math.PI / 180;

interface SixAxisData {
  /** Shoulder offset, upper arm, elbow offset, column height, forearm, flange, all m. */
  readonly shoulder: number;
  readonly upperArm: number;
  readonly elbow: number;
  readonly column: number;
  readonly forearm: number;
  readonly flange: number;
  /** Degrees, degrees per second and degrees per second squared, joint 1 to 6. */
  readonly limits: readonly (readonly [number, number])[];
  readonly speeds: readonly number[];
  readonly ramps: readonly number[];
}

/** Six axes, ortho-parallel base, spherical wrist, in standard Denavit-Hartenberg rows. */
export function sixAxis(data: SixAxisData): Arm {
  const a = [data.shoulder, data.upperArm, data.elbow, 0, 0, 0];
  const alpha = [-90, 0, -90, 90, -90, 0];
  const d = [data.column, 0, 0, data.forearm, 0, data.flange];
  const joints = a.map((length, index): Joint => ({
    type: 'revolute',
    a: length,
    alpha: alpha[index] * DEGREE,
    d: d[index],
    theta: 0,
    min: data.limits[index][0] * DEGREE,
    max: data.limits[index][1] * DEGREE,
    maxSpeed: data.speeds[index] * DEGREE,
    maxAcceleration: data.ramps[index] * DEGREE,
  }));
  return { convention: 'standard', joints };
}
