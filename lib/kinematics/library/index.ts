import type { Arm } from '../types';
import { gantry } from './gantry';
import { palletiser } from './palletiser';
import { scara } from './scara';
import { sevenAxis } from './seven-axis';
import { sixAxis } from './six-axis';
import { onTrack } from './track';

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
  {
    slug: 'palletiser-130kg',
    name: 'Palletiser 130 kg, 2.9 m',
    description: 'Four-axis arm with a parallelogram that keeps the gripper level, for stacking cases and layers.',
    payloadKg: 130,
    arm: palletiser({
      shoulder: 0.28,
      upperArm: 1.15,
      forearm: 1.3,
      wrist: 0.24,
      column: 0.85,
      flange: 0.24,
      limits: [
        [-180, 180],
        [-135, 0],
        [-20, 100],
        [-350, 350],
      ],
      speeds: [140, 115, 135, 310],
      ramps: [380, 320, 380, 900],
      elbow: [28, 165],
    }),
  },
  {
    slug: 'seven-axis-9kg',
    name: 'Seven-axis 9 kg, 0.9 m',
    description: 'Light seven-axis arm that can move its elbow aside while the tool stands still, for assembly.',
    payloadKg: 9,
    arm: sevenAxis({
      column: 0.355,
      upperArm: 0.455,
      forearm: 0.425,
      flange: 0.13,
      limits: [170, 115, 170, 118, 170, 115, 175],
      speeds: [95, 95, 110, 125, 140, 160, 170],
      ramps: [320, 320, 380, 420, 480, 560, 600],
    }),
  },
  {
    slug: 'track-six-axis-30kg',
    name: 'Six-axis 30 kg, 2 m, on a 3 m track',
    description:
      'Medium six-axis arm with a spherical wrist that runs along a floor track, for serving several machines.',
    payloadKg: 30,
    arm: onTrack(
      sixAxis({
        shoulder: 0.2,
        upperArm: 0.88,
        elbow: 0.16,
        column: 0.92,
        forearm: 0.9,
        flange: 0.14,
        limits: [
          [-175, 175],
          [-150, 60],
          [-200, 75],
          [-200, 200],
          [-122, 122],
          [-360, 360],
        ],
        speeds: [175, 165, 175, 255, 250, 370],
        ramps: [520, 480, 520, 900, 900, 1400],
      }),
      { halfTravel: 1.5, speed: 1.5, ramp: 2 },
    ),
  },
  {
    slug: 'gantry-40kg',
    name: 'Gantry 40 kg, 4 × 2.4 × 1.1 m',
    description: 'Three-axis gantry with a wrist that hangs from its quill, for loading machines from above.',
    payloadKg: 40,
    arm: gantry({
      beam: 2.6,
      quill: 0.35,
      flange: 0.16,
      travels: [
        [-2, 2],
        [-1.2, 1.2],
        [0, 1.1],
      ],
      speeds: [2.4, 2, 1.5],
      ramps: [3, 3, 4],
      wristLimits: [190, 120, 360],
      wristSpeeds: [180, 180, 260],
      wristRamps: [600, 600, 900],
    }),
  },
];
