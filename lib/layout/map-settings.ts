import { z } from 'zod';
import { distanceValuesSchema } from './protective/distance-values';

export const mapMeasureSchema = z.enum([
  'inverseConditionNumber',
  'maximumToolSpeed',
  'sureSpeed',
  'wristCoverage',
  'reach',
]);

/** Which map a sheet shows: one setting a layout, so that the whole team looks at the same question. */
export const mapSettingsSchema = z.object({
  toolHeightMm: z.number().min(-5000).max(20_000).default(850),
  /** 0 straight down, 90 level, 180 straight up. */
  tiltDeg: z.number().min(0).max(180).default(0),
  /** Where a tilted tool points: away from the robot's first axis, or along one heading of the floor. */
  towards: z.enum(['outward', 'heading']).default('outward'),
  headingDeg: z.number().min(-360).max(360).default(0),
  /** Half angle of the cone of directions that the tool has to be held in, 0: the one direction. */
  coneDeg: z.number().min(0).max(90).default(0),
  rollDeg: z.union([z.number().min(-360).max(360), z.literal('free')]).default('free'),
  wrist: z.enum(['held', 'free']).default('held'),
  /** The best branch a spot, or one named class; an arm without that class is mapped with its best. */
  branch: z.string().trim().min(1).max(80).default('best'),
  /** Heights of a stack of maps (mm over the floor); the one shown is `toolHeightMm`. Empty: one map only. */
  stackMm: z.array(z.number().min(-5000).max(20_000)).max(12, 'A stack has at most 12 heights.').default([]),
  /** With a stack: the map of one height, or the worst of all of them spot by spot. */
  stackShown: z.enum(['height', 'worst']).default('height'),
  stepMm: z.number().min(5).max(200).default(25),
  measure: mapMeasureSchema.default('inverseConditionNumber'),
  /** The line drawn in the key, per measure; null where nobody has set one. */
  thresholds: z
    .object({
      inverseConditionNumber: z.number().min(0).max(1).nullable().default(0.1),
      maximumToolSpeed: z.number().min(0).max(100).nullable().default(null),
      sureSpeed: z.number().min(0).max(100).nullable().default(null),
      wristCoverage: z.number().min(0).max(1).nullable().default(null),
    })
    .prefault({}),
  /** Figures of standards that distances on the sheet are measured against. */
  distances: distanceValuesSchema.prefault({}),
});

export type MapSettings = z.infer<typeof mapSettingsSchema>;
export type MapMeasure = MapSettings['measure'];
/** Measures with a value a spot; reach is only a mask. */
export type ScaledMeasure = Exclude<MapMeasure, 'reach'>;
