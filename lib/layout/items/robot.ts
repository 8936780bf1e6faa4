import { z } from 'zod';
import { degrees, itemName, millimetres, placed } from './common';
import { sequenceStepSchema } from './sequence';

const mass = z.number().min(0, 'A mass is 0 kg or more.').max(5000, 'At most 5000 kg.');
/** About the centre of mass, along the flange's axes, kg m². */
const inertia = z.object({
  xx: z.number().min(0).max(10_000),
  yy: z.number().min(0).max(10_000),
  zz: z.number().min(0).max(10_000),
});
const centre = z.object({ xMm: millimetres, yMm: millimetres, zMm: millimetres });

/** The tool on a robot: offset of the tool point in the flange frame and a rotation about fixed x, y, z. */
export const toolSchema = z.object({
  name: itemName.default('Tool'),
  xMm: millimetres.default(0),
  yMm: millimetres.default(0),
  zMm: millimetres.default(0),
  rollDeg: degrees.default(0),
  pitchDeg: degrees.default(0),
  yawDeg: degrees.default(0),
  massKg: mass.default(0),
  /** How far the tool's body stands out round its tool point. */
  radiusMm: z.number().min(0, 'A radius is 0 or more.').max(20_000).default(0),
  /** Centre of mass in the flange frame, and moments of inertia about it; null: not known. */
  centreMm: centre.nullable().default(null),
  inertiaKgM2: inertia.nullable().default(null),
});

/** What the robot carries at its heaviest. */
export const partSchema = z.object({
  name: itemName.default('Part'),
  massKg: mass,
  /** How far it stands out from the tool point. */
  radiusMm: z.number().min(0).max(20_000).default(0),
  /** Centre of mass in the flange frame, and moments of inertia about it; null: not known. */
  centreMm: centre.nullable().default(null),
  inertiaKgM2: inertia.nullable().default(null),
});

/** What the arm's data sheet allows at the flange beside the payload; null: not known. */
export const wristRatingSchema = z.object({
  momentNm: z.number().positive('A rating is above zero.').max(1_000_000).nullable().default(null),
  inertiaKgM2: z.number().positive('A rating is above zero.').max(1_000_000).nullable().default(null),
});

/** A limiting device on a joint: hard stop or safe software limit. Degrees for a turning joint, mm for a sliding one. */
export const jointStopSchema = z
  .object({
    /** Counted from 1. */
    joint: z.number().int().min(1).max(12),
    min: z.number().min(-100_000).max(100_000),
    max: z.number().min(-100_000).max(100_000),
  })
  .refine(({ min, max }) => min < max, { path: ['min'], message: 'A stop begins below where it ends.' });

export const robotSchema = z.object({
  kind: z.literal('robot'),
  ...placed,
  /** One frozen version of an arm of the library. */
  armId: z.uuid(),
  riserMm: z.number().min(0).max(20_000).default(0),
  tool: toolSchema.prefault({}),
  /** What limits the restricted space; joints without one count with their whole range. */
  jointStops: z.array(jointStopSchema).max(12).default([]),
  part: partSchema.nullable().default(null),
  wristRating: wristRatingSchema.nullable().default(null),
  sequence: z.array(sequenceStepSchema).max(300, 'A sequence has at most 300 steps.').default([]),
  targetCycleS: z.number().positive('A target time is above zero.').max(36_000).nullable().default(null),
});

export type Tool = z.infer<typeof toolSchema>;
export type JointStop = z.infer<typeof jointStopSchema>;
export type Part = z.infer<typeof partSchema>;
export type WristRating = z.infer<typeof wristRatingSchema>;
export type Robot = z.infer<typeof robotSchema>;
