import { z } from 'zod';
import { idSchema, timestampSchema } from './common';

/** POST /api/maps. The answer is 200 with a finished map, or 202 with one that is under way. */
export { mapQuestionSchema, type MapQuestion } from '@/lib/layout/map-question-schema';

export const mapStateSchema = z.enum(['queued', 'running', 'done', 'failed', 'cancelled']);

/** What a finished map says in numbers. Lengths in m, areas in m², speeds in m/s. */
export const mapSummarySchema = z.object({
  reachedAreaM2: z.number(),
  bestInverseConditionNumber: z.number().nullable(),
  fastestToolSpeed: z.number().nullable(),
  quantiles: z.object({
    inverseConditionNumber: z.array(z.number()),
    maximumToolSpeed: z.array(z.number()),
    sureSpeed: z.array(z.number()),
  }),
});

/** GET /api/maps/[mapId]; POST …/cancel and …/retry answer the same. */
export const dexterityMapSchema = z.object({
  id: idSchema,
  /** SHA-256 of the whole question and the kernel's version. */
  key: z.string().length(64),
  state: mapStateSchema,
  progress: z.object({ done: z.number().int(), total: z.number().int() }),
  /** Why it failed, in plain words. */
  failure: z.string().nullable(),
  grid: z.object({
    /** Centre of the first cell in the base frame, mm; rows run along +y. */
    originMm: z.tuple([z.number(), z.number()]),
    stepMm: z.number(),
    columns: z.number().int(),
    rows: z.number().int(),
  }),
  summary: mapSummarySchema.nullable(),
  askedAt: timestampSchema,
  finishedAt: timestampSchema.nullable(),
});
export type DexterityMap = z.infer<typeof dexterityMapSchema>;

/**
 * GET /api/maps/[mapId]/tiles: application/octet-stream, the tiles one behind another, each as a 4-byte little-endian length
 * and the bytes of lib/kinematics encodeMapTile. Answers 409 `map_not_ready` before the map is done.
 */
export const MAP_TILES_MEDIA_TYPE = 'application/octet-stream';
