import { z } from 'zod';
import { millimetres, placed, pointMm } from './common';

export const dimensionSchema = z.object({
  kind: z.literal('dimension'),
  ...placed,
  /** The two measured points, and how far the dimension line stands off them (to the left of from → to). */
  fromMm: pointMm,
  toMm: pointMm,
  offsetMm: millimetres.default(0),
  /**
   * Items that an end is attached to, and the measured point in that item's frame. An attached end stands where its item
   * carries it (`lib/layout/attached-dimensions.ts`); the point above is where it last stood, for when the item is gone.
   */
  fromItemId: z.uuid().optional(),
  fromAnchorMm: pointMm.optional(),
  toItemId: z.uuid().optional(),
  toAnchorMm: pointMm.optional(),
});

export type Dimension = z.infer<typeof dimensionSchema>;
