import { z } from 'zod';
import { itemSchema } from '@/lib/layout/items';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { floorPlanSchema } from './floor-plans';
import { libraryArmSchema } from './arms';
import { idSchema, timestampSchema } from './common';

const layoutName = z.string().trim().min(1, 'Give the variant a name.').max(120);

/** POST /api/projects/[projectId]/layouts; `copyOf` starts the variant from another one of the same project. */
export const layoutRequestSchema = z.object({ name: layoutName, copyOf: idSchema.nullable().default(null) });
export type LayoutRequest = z.infer<typeof layoutRequestSchema>;
/** PATCH /api/layouts/[layoutId] */
export const layoutChangeSchema = z.object({
  name: layoutName.optional(),
  floorPlanId: idSchema.nullable().optional(),
  mapSettings: mapSettingsSchema.optional(),
});
export type LayoutChange = z.infer<typeof layoutChangeSchema>;

export const layoutStateSchema = z.enum(['draft', 'issued', 'accepted', 'changes_requested', 'superseded']);
export type LayoutState = z.infer<typeof layoutStateSchema>;

/** An item as stored: its document and the version that the next edit must name. */
export const storedItemSchema = z.object({ version: z.number().int().min(1), item: itemSchema });
export type StoredItem = z.infer<typeof storedItemSchema>;

/** A row of a project's list of variants. `letter` is given by the server: A, B, … */
export const layoutSummarySchema = z.object({
  id: idSchema,
  projectId: idSchema,
  letter: z.string(),
  name: z.string(),
  /** Counts every accepted batch of edits. */
  version: z.number().int(),
  floorPlanId: idSchema.nullable(),
  latestRevision: z.object({ id: idSchema, number: z.number().int(), state: layoutStateSchema }).nullable(),
  itemCount: z.number().int(),
  createdAt: timestampSchema,
  updatedAt: timestampSchema,
});
export type LayoutSummary = z.infer<typeof layoutSummarySchema>;
export const layoutListSchema = z.object({ layouts: z.array(layoutSummarySchema) });

/** GET /api/layouts/[layoutId]: all that the sheet needs to draw. */
export const layoutSchema = layoutSummarySchema.extend({
  projectName: z.string(),
  mapSettings: mapSettingsSchema,
  items: z.array(storedItemSchema),
  floorPlan: floorPlanSchema.nullable(),
  /** Every arm version that an item names. */
  arms: z.array(libraryArmSchema),
});
export type Layout = z.infer<typeof layoutSchema>;

/** One small edit. `baseVersion` is the version it was made on; 0 for a new item. */
export const operationSchema = z.discriminatedUnion('type', [
  z.object({ type: z.literal('put'), baseVersion: z.number().int().min(0), item: itemSchema }),
  z.object({ type: z.literal('remove'), baseVersion: z.number().int().min(1), itemId: idSchema }),
]);
export type Operation = z.infer<typeof operationSchema>;

/** POST /api/layouts/[layoutId]/operations. `id` is made by the client: the same batch sent twice is applied once. */
export const operationBatchSchema = z.object({ id: idSchema, operations: z.array(operationSchema).min(1).max(1000) });
export type OperationBatch = z.infer<typeof operationBatchSchema>;
export const operationResultSchema = z.object({
  layoutVersion: z.number().int(),
  /** New versions of the items put, in the order sent; removed ones are left out. */
  items: z.array(z.object({ id: idSchema, version: z.number().int() })),
});
export type OperationResult = z.infer<typeof operationResultSchema>;
/** Extra members of the 409 problem `stale_item`: nothing of the batch was applied. `current` is null where it was removed. */
export const staleItemsSchema = z.object({
  conflicts: z.array(z.object({ itemId: idSchema, current: storedItemSchema.nullable() })),
});

/** GET /api/layouts/[layoutId]/changes?since=7: what other planners changed after that layout version. */
export const layoutChangesQuerySchema = z.object({ since: z.coerce.number().int().min(0) });
export const layoutChangesSchema = z.object({
  layoutVersion: z.number().int(),
  items: z.array(storedItemSchema),
  removed: z.array(idSchema),
  mapSettings: mapSettingsSchema,
  floorPlanId: idSchema.nullable(),
});
export type LayoutChanges = z.infer<typeof layoutChangesSchema>;

/** GET /api/layouts/[layoutId]/thumbnail?width=160&board=day: a small PNG of the draft. */
export const thumbnailQuerySchema = z.object({
  width: z.coerce.number().int().min(40).max(640).default(160),
  board: z.enum(['day', 'night']).default('day'),
});
export type ThumbnailQuery = z.output<typeof thumbnailQuerySchema>;
