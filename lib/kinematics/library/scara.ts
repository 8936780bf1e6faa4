import type { Arm, Joint } from '../types';

const DEGREE = Math.PI / 180;

interface ScaraData {
  /** m */
  readonly innerLink: number;
  readonly outerLink: number;
  readonly column: number;
  readonly stroke: number;
  /** Degrees and degrees per second of joints 1, 2 and 4; quill speed in m/s and m/s². */
  readonly limits: readonly (readonly [number, number])[];
  readonly speeds: readonly number[];
  readonly ramps: readonly number[];
  readonly quillSpeed: number;
  readonly quillRamp: number;
}

/** Two turns about level-crossing vertical axes, a quill that drops, and a turn of the quill: R R P R. */
export function scara(data: ScaraData): Arm {
  const turn = (index: number, row: Pick<Joint, 'a' | 'alpha' | 'd'>): Joint => ({
    type: 'revolute',
    ...row,
    theta: 0,
    min: data.limits[index][0] * DEGREE,
    max: data.limits[index][1] * DEGREE,
    maxSpeed: data.speeds[index] * DEGREE,
    maxAcceleration: data.ramps[index] * DEGREE,
  });
  return {
    convention: 'standard',
    joints: [
      turn(0, { a: data.innerLink, alpha: 0, d: data.column }),
      // The half turn makes the quill's own axis point down, so a positive stroke drops the tool.
      turn(1, { a: data.outerLink, alpha: Math.PI, d: 0 }),
      {
        type: 'prismatic',
        a: 0,
        alpha: 0,
        d: 0,
        theta: 0,
        min: 0,
        max: data.stroke,
        maxSpeed: data.quillSpeed,
        maxAcceleration: data.quillRamp,
      },
      turn(2, { a: 0, alpha: 0, d: 0 }),
    ],
  };
}
