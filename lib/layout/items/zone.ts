import { z } from 'zod';
import { cornersFree, outline, placed } from './common';

/** A marked part of the floor: where no base may stand, or where only one robot may work at a time. */
export const zoneSchema = z.object({
  kind: z.literal('zone'),
  ...placed,
  outlineMm: outline,
  cornersFree,
  use: z.enum(['keepOut', 'shared']).default('keepOut'),
});

export type Zone = z.infer<typeof zoneSchema>;
export type ZoneUse = Zone['use'];
