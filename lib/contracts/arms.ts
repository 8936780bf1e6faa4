import { z } from 'zod';
import { armSchema } from './arm';
import { idSchema, timestampSchema } from './common';

/** One frozen version of an arm in an organisation's library. GET /api/arms, GET /api/arms/[armId] */
export const libraryArmSchema = z.object({
  id: idSchema,
  /** Shared by all versions of one arm. */
  familyId: idSchema,
  version: z.number().int().min(1),
  name: z.string(),
  description: z.string(),
  payloadKg: z.number().nullable(),
  reachMm: z.number(),
  definition: armSchema,
  createdAt: timestampSchema,
  /** False once a newer version exists. */
  latest: z.boolean(),
  layoutCount: z.number().int(),
});
export type LibraryArm = z.infer<typeof libraryArmSchema>;
export const libraryArmListSchema = z.object({ arms: z.array(libraryArmSchema) });
