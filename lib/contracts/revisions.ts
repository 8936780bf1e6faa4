import { z } from 'zod';
import { itemSchema } from '@/lib/layout/items';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { floorPlanSchema } from './floor-plans';
import { libraryArmSchema } from './arms';
import { idSchema, timestampSchema } from './common';
import { layoutStateSchema } from './layouts';
import { signOffSchema } from './sign-offs';

/** POST /api/layouts/[layoutId]/revisions: issue a frozen copy; GET there lists what was issued, newest first. */
export const issueRequestSchema = z.object({ note: z.string().trim().max(2000).default('') });

export const revisionSummarySchema = z.object({
  id: idSchema,
  layoutId: idSchema,
  projectId: idSchema,
  number: z.number().int().min(1),
  state: layoutStateSchema,
  note: z.string(),
  sha256: z.string().length(64),
  issuedAt: timestampSchema,
  issuedBy: z.string(),
  signOffs: z.array(signOffSchema),
});
export type RevisionSummary = z.infer<typeof revisionSummarySchema>;
export const revisionListSchema = z.object({ revisions: z.array(revisionSummarySchema) });

/** What is frozen and hashed (canonical JSON). */
export const snapshotSchema = z.object({
  format: z.literal(1),
  projectName: z.string(),
  customerName: z.string(),
  letter: z.string(),
  name: z.string(),
  layoutVersion: z.number().int(),
  items: z.array(itemSchema),
  arms: z.array(libraryArmSchema.omit({ layoutCount: true, latest: true, createdAt: true, archivedAt: true })),
  floorPlan: floorPlanSchema.nullable(),
  mapSettings: mapSettingsSchema,
  /** The stored map of each robot at the moment of issue; robots whose map was not finished are left out. */
  maps: z.array(z.object({ robotId: idSchema, mapId: idSchema, key: z.string() })),
});
export type Snapshot = z.infer<typeof snapshotSchema>;

/** GET /api/revisions/[revisionId] */
export const revisionSchema = revisionSummarySchema.extend({ snapshot: snapshotSchema });
export type Revision = z.infer<typeof revisionSchema>;
