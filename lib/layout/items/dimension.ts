import { z } from 'zod';
import { millimetres, placed, pointMm } from './common';

export const dimensionSchema = z.object({
  kind: z.literal('dimension'),
  ...placed,
  /** The two measured points, and how far the dimension line stands off them (to the left of from → to). */
  fromMm: pointMm,
  toMm: pointMm,
  offsetMm: millimetres.default(0),
});

export type Dimension = z.infer<typeof dimensionSchema>;
