import { z } from 'zod';
import type { JobDefinition } from './definition';

/** One tile of one attempt at a map. */
export const mapTileSchema = z.object({
  mapId: z.uuid(),
  attempt: z.number().int().min(1),
  index: z.number().int().min(0),
});
export type MapTileJob = z.infer<typeof mapTileSchema>;

export const mapTileJob = {
  name: 'map-tile',
  schema: mapTileSchema,
  // A tile takes about a second; a map hangs for this long when its worker is killed.
  options: { expireInSeconds: 20, retryLimit: 10, retryDelay: 1, retryBackoff: false },
} as const satisfies JobDefinition<typeof mapTileSchema>;
