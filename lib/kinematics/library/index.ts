import type { Arm } from '../types';
import { scara } from './scara';
import { sixAxis } from './six-axis';

export interface BuiltInArm {
  readonly slug: string;
  readonly name: string;
  readonly description: string;
  readonly payloadKg: number;
  readonly arm: Arm;
}

/** Invented data within the ranges that such arms have on the market (common practice, no source). */
export const BUILT_IN_ARMS: readonly BuiltInArm[] = [
  {
    slug: 'six-axis-6kg',
    name: 'Six-axis 6 kg, 0.9 m',
    description: 'Small six-axis arm with a spherical wrist for machine tending and small parts.',
    payloadKg: 6,
    arm: sixAxis({
      shoulder: 0.05,
      upperArm: 0.43,
      elbow: 0.035,
      column: 0.345,
      forearm: 0.42,
      flange: 0.08,
      limits: [
        [-170, 170],
        [-140, 70],
        [-200, 70],
        [-200, 200],
        [-125, 125],
        [-360, 360],
      ],
      speeds: [380, 330, 400, 450, 450, 600],
      ramps: [1500, 1300, 1600, 2200, 2200, 3000],
    }),
  },
  {
    slug: 'six-axis-12kg',
    name: 'Six-axis 12 kg, 1.4 m',
    description:
      'Medium six-axis arm with a spherical wrist and a shoulder offset for handling, deburring and welding.',
    payloadKg: 12,
    arm: sixAxis({
      shoulder: 0.15,
      upperArm: 0.62,
      elbow: 0.12,
      column: 0.45,
      forearm: 0.63,
      flange: 0.1,
      limits: [
        [-170, 170],
        [-155, 65],
        [-195, 75],
        [-190, 190],
        [-120, 120],
        [-360, 360],
      ],
      speeds: [166, 149, 166, 258, 258, 355],
      ramps: [620, 560, 620, 900, 900, 1400],
    }),
  },
  {
    slug: 'six-axis-90kg',
    name: 'Six-axis 90 kg, 2.7 m',
    description: 'Large six-axis arm with a spherical wrist for heavy handling and spot work.',
    payloadKg: 90,
    arm: sixAxis({
      shoulder: 0.32,
      upperArm: 1.15,
      elbow: 0.2,
      column: 0.75,
      forearm: 1.22,
      flange: 0.215,
      limits: [
        [-180, 180],
        [-150, 60],
        [-205, 75],
        [-210, 210],
        [-125, 125],
        [-360, 360],
      ],
      speeds: [110, 105, 110, 170, 165, 240],
      ramps: [300, 280, 300, 520, 520, 800],
    }),
  },
  {
    slug: 'scara-5kg',
    name: 'SCARA 5 kg, 0.6 m',
    description: 'Four-axis arm with a level elbow and a quill, for picking and placing from above.',
    payloadKg: 5,
    arm: scara({
      innerLink: 0.325,
      outerLink: 0.275,
      column: 0.38,
      stroke: 0.2,
      limits: [
        [-132, 132],
        [-150, 150],
        [-360, 360],
      ],
      speeds: [430, 680, 690],
      ramps: [2600, 4200, 5200],
      quillSpeed: 1.1,
      quillRamp: 9,
    }),
  },
];
