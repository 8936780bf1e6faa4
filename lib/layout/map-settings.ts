import { z } from 'zod';

/** Which map a sheet shows: one setting a layout, so that the whole team looks at the same question. */
export const mapSettingsSchema = z.object({
  toolHeightMm: z.number().min(-5000).max(20_000).default(850),
  /** 0 straight down, 90 level, 180 straight up. */
  tiltDeg: z.number().min(0).max(180).default(0),
  /** Where a tilted tool points: away from the robot's first axis, or along one heading of the floor. */
  towards: z.enum(['outward', 'heading']).default('outward'),
  headingDeg: z.number().min(-360).max(360).default(0),
  rollDeg: z.union([z.number().min(-360).max(360), z.literal('free')]).default('free'),
  wrist: z.enum(['held', 'free']).default('held'),
  stepMm: z.number().min(5).max(200).default(25),
  measure: z
    .enum(['inverseConditionNumber', 'maximumToolSpeed', 'sureSpeed', 'reach'])
    .default('inverseConditionNumber'),
  /** The line drawn in the key, per measure; null where nobody has set one. */
  thresholds: z
    .object({
      inverseConditionNumber: z.number().min(0).max(1).nullable().default(0.1),
      maximumToolSpeed: z.number().min(0).max(100).nullable().default(null),
      sureSpeed: z.number().min(0).max(100).nullable().default(null),
    })
    .prefault({}),
});

export type MapSettings = z.infer<typeof mapSettingsSchema>;
export type MapMeasure = MapSettings['measure'];
/** Measures with a value a spot; reach is only a mask. */
export type ScaledMeasure = Exclude<MapMeasure, 'reach'>;
