import { z } from 'zod';
import { heightRange, placed, pointMm } from './common';

/** A conveyor along its middle line, in the direction in which it carries. Its top (`zToMm`) is the carrying surface. */
export const conveyorSchema = z.object({
  kind: z.literal('conveyor'),
  ...placed,
  pointsMm: z
    .array(pointMm)
    .min(2, 'A conveyor needs at least two points.')
    .max(200, 'A conveyor has at most 200 points.'),
  widthMm: z.number().positive('A conveyor has a width above zero.').max(20_000, 'At most 20000 mm wide.'),
  ...heightRange,
  /** Belt speed, mm/s; null: not known. */
  speedMmS: z.number().positive('A speed is above zero.').max(20_000, 'At most 20000 mm/s.').nullable().default(null),
});

export type Conveyor = z.infer<typeof conveyorSchema>;
