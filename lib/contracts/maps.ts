import { z } from 'zod';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { toolSchema } from '@/lib/layout/items';
import { idSchema, timestampSchema } from './common';

/**
 * POST /api/maps. A map is asked for in the robot's own base frame, so it stays the same wherever the base stands:
 * x out of the base, heights above the base plate. The answer is 200 with a finished map, or 202 with one that is under way.
 */
export const mapQuestionSchema = z.object({
  armId: idSchema,
  tool: toolSchema.omit({ name: true, massKg: true }),
  /** Height of the tool point above the base plate: tool height on the sheet less the riser. */
  toolHeightMm: z.number().min(-20_000).max(20_000),
  settings: mapSettingsSchema.pick({ tiltDeg: true, towards: true, rollDeg: true, wrist: true, stepMm: true }),
  /** Heading in the base frame; only used with `towards: heading` and a tilt. */
  headingDeg: z.number().min(-720).max(720).default(0),
});
export type MapQuestion = z.infer<typeof mapQuestionSchema>;

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
