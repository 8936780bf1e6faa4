import type { Arm, Joint } from '../types';

const DEGREE = Math.PI / 180;
const RIGHT_ANGLE = Math.PI / 2;

interface GantryData {
  /** Beam over the floor, wrist centre below the quill's top when drawn in, wrist to flange, all m. */
  readonly beam: number;
  readonly quill: number;
  readonly flange: number;
  /** m, m/s and m/s² of the runway (y), the bridge (x) and the quill (down). */
  readonly travels: readonly (readonly [number, number])[];
  readonly speeds: readonly number[];
  readonly ramps: readonly number[];
  /** Degrees either way, degrees per second and degrees per second squared of the wrist. */
  readonly wristLimits: readonly number[];
  readonly wristSpeeds: readonly number[];
  readonly wristRamps: readonly number[];
}

/** Three slides at right angles and a spherical wrist that hangs from the quill, in Craig's rows. */
export function gantry(data: GantryData): Arm {
  const slideRows = [
    { a: 0, alpha: -RIGHT_ANGLE, theta: -RIGHT_ANGLE, d: 0 },
    { a: data.beam, alpha: -RIGHT_ANGLE, theta: -RIGHT_ANGLE, d: 0 },
    { a: 0, alpha: RIGHT_ANGLE, theta: RIGHT_ANGLE, d: data.quill },
  ];
  const slides = slideRows.map((row, index): Joint => ({
    type: 'prismatic',
    ...row,
    min: data.travels[index][0],
    max: data.travels[index][1],
    maxSpeed: data.speeds[index],
    maxAcceleration: data.ramps[index],
  }));
  const wrist = [0, RIGHT_ANGLE, -RIGHT_ANGLE].map((alpha, index): Joint => ({
    type: 'revolute',
    a: 0,
    alpha,
    d: index === 2 ? data.flange : 0,
    theta: 0,
    min: -data.wristLimits[index] * DEGREE,
    max: data.wristLimits[index] * DEGREE,
    maxSpeed: data.wristSpeeds[index] * DEGREE,
    maxAcceleration: data.wristRamps[index] * DEGREE,
  }));
  return { convention: 'modified', joints: [...slides, ...wrist] };
}
