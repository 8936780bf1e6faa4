import type { Arm, Joint } from '../types';

const DEGREE = Math.PI / 180;

interface PalletiserData {
  /** Shoulder offset, upper arm, forearm, wrist offset, column height and flange, all m. */
  readonly shoulder: number;
  readonly upperArm: number;
  readonly forearm: number;
  readonly wrist: number;
  readonly column: number;
  readonly flange: number;
  /**
   * Degrees, degrees per second and degrees per second squared of the four actuators: the turn of the column; the upper arm and the
   * forearm, each as it leans against the column (upright is −90, level 0, hanging 90); the turn of the flange.
   */
  readonly limits: readonly (readonly [number, number])[];
  readonly speeds: readonly number[];
  readonly ramps: readonly number[];
  /** Degrees between the upper arm and the forearm, 0 stretched. */
  readonly elbow: readonly [number, number];
}

/**
 * Four axes, the forearm driven through a parallelogram from the column and the flange kept level by a second one: five chain joints on four
 * actuators. The forearm keeps its lean while the upper arm moves (q3 = u3 − u2), and the wrist takes off whatever lean there is (q4 = −u3).
 */
export function palletiser(data: PalletiserData): Arm {
  const limits = [data.limits[0], data.limits[1], data.elbow, reversed(data.limits[2]), data.limits[3]];
  const driver = [0, 1, 2, 2, 3];
  const a = [data.shoulder, data.upperArm, data.forearm, data.wrist, 0];
  const alpha = [-90, 0, 0, -90, 0];
  const d = [data.column, 0, 0, 0, data.flange];
  const joints = a.map((length, index): Joint => ({
    type: 'revolute',
    a: length,
    alpha: alpha[index] * DEGREE,
    d: d[index],
    theta: 0,
    min: limits[index][0] * DEGREE,
    max: limits[index][1] * DEGREE,
    maxSpeed: data.speeds[driver[index]] * DEGREE,
    maxAcceleration: data.ramps[driver[index]] * DEGREE,
  }));
  return {
    convention: 'standard',
    joints,
    coupling: [
      [1, 0, 0, 0],
      [0, 1, 0, 0],
      [0, -1, 1, 0],
      [0, 0, -1, 0],
      [0, 0, 0, 1],
    ],
    actuators: data.limits.map(([min, max], index) => ({
      min: min * DEGREE,
      max: max * DEGREE,
      maxSpeed: data.speeds[index] * DEGREE,
      maxAcceleration: data.ramps[index] * DEGREE,
    })),
  };
}

const reversed = ([min, max]: readonly [number, number]): readonly [number, number] => [-max, -min];
