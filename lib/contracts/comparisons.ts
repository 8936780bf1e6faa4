import { z } from 'zod';
import { mapMeasureSchema } from '@/lib/layout/map-settings';
import { idSchema, timestampSchema } from './common';

/** `layout:<id>` for a draft as it is, `revision:<id>` for what was issued. */
const sheetRef = z.string().regex(/^(layout|revision):[0-9a-f-]{36}$/);

export const comparisonViewSchema = z.object({ measure: mapMeasureSchema, wrist: z.enum(['held', 'free']) });
export type ComparisonView = z.infer<typeof comparisonViewSchema>;

/** POST /api/projects/[projectId]/comparisons; GET there lists what was kept; DELETE /api/comparisons/[comparisonId]. */
export const comparisonRequestSchema = z.object({
  name: z.string().trim().min(1, 'Give the comparison a name.').max(120),
  sheets: z.array(sheetRef).min(2).max(4),
  view: comparisonViewSchema,
});
export type ComparisonRequest = z.infer<typeof comparisonRequestSchema>;

export const comparisonSchema = comparisonRequestSchema.extend({
  id: idSchema,
  createdBy: z.string(),
  createdAt: timestampSchema,
});
export type Comparison = z.infer<typeof comparisonSchema>;
export const comparisonListSchema = z.object({ comparisons: z.array(comparisonSchema) });
