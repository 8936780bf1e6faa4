import type { Arm, Joint } from '../types';

const DEGREE = Math.PI / 180;

interface SevenAxisData {
  /** Base to shoulder, upper arm, forearm, wrist to flange, all m. */
  readonly column: number;
  readonly upperArm: number;
  readonly forearm: number;
  readonly flange: number;
  /** Degrees either way, degrees per second and degrees per second squared, joint 1 to 7. */
  readonly limits: readonly number[];
  readonly speeds: readonly number[];
  readonly ramps: readonly number[];
}

/** Three axes through the shoulder, one elbow, three axes through the wrist, without offsets. */
export function sevenAxis(data: SevenAxisData): Arm {
  const alpha = [-90, 90, 90, -90, -90, 90, 0];
  const d = [data.column, 0, data.upperArm, 0, data.forearm, 0, data.flange];
  const joints = d.map((offset, index): Joint => ({
    type: 'revolute',
    a: 0,
    alpha: alpha[index] * DEGREE,
    d: offset,
    theta: 0,
    min: -data.limits[index] * DEGREE,
    max: data.limits[index] * DEGREE,
    maxSpeed: data.speeds[index] * DEGREE,
    maxAcceleration: data.ramps[index] * DEGREE,
  }));
  return { convention: 'standard', joints };
}
