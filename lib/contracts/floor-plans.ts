import { z } from 'zod';
import { calibrationRequestSchema, calibrationSchema } from '@/lib/layout/calibration';
import { idSchema, timestampSchema } from './common';

export { calibrationRequestSchema } from '@/lib/layout/calibration';

export const FLOOR_PLAN_MAX_BYTES = 40 * 1024 * 1024;
export const FLOOR_PLAN_MAX_PIXELS = 50_000_000;

/** POST /api/projects/[projectId]/floor-plans: multipart form with `file` and optional `name`. */
export const floorPlanSchema = z.object({
  id: idSchema,
  projectId: idSchema,
  name: z.string(),
  /** Size of the upright picture, pixels. */
  widthPx: z.number().int(),
  heightPx: z.number().int(),
  /** Widths at hand from GET /api/floor-plans/[floorPlanId]/picture?width=…, smallest first. */
  pictureWidths: z.array(z.number().int()),
  calibration: calibrationSchema.nullable(),
  createdAt: timestampSchema,
});
export type FloorPlan = z.infer<typeof floorPlanSchema>;
export const floorPlanListSchema = z.object({ floorPlans: z.array(floorPlanSchema) });

/** PATCH /api/floor-plans/[floorPlanId] (GET and DELETE there too): rename, set to scale, or (null) take the scale off. */
export const floorPlanChangeSchema = z.object({
  name: z.string().trim().min(1, 'Give the floor plan a name.').max(120).optional(),
  calibration: calibrationRequestSchema.nullable().optional(),
});
export type FloorPlanChange = z.infer<typeof floorPlanChangeSchema>;

/** GET …/picture?width=1024 answers the smallest stored size at least that wide, else the largest. */
export const pictureQuerySchema = z.object({ width: z.coerce.number().int().min(1).max(20_000).default(2048) });
