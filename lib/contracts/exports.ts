import { z } from 'zod';
import { idSchema } from './common';

/** What can be exported: the draft of a variant, or an issued revision. */
export const exportSubjectSchema = z.enum(['layouts', 'revisions']);
export type ExportSubject = z.infer<typeof exportSubjectSchema>;

/**
 * GET /api/exports/layouts/[subjectId]/[file] and …/revisions/[subjectId]/[file]; answers a download.
 * `layout.json` whole layout, `layout.dxf` linework in mm, `verdicts.csv`, `map.csv` every spot of every robot's map.
 */
export const exportFileSchema = z.enum(['layout.json', 'layout.dxf', 'verdicts.csv', 'map.csv']);
export type ExportFile = z.infer<typeof exportFileSchema>;

export const exportParamsSchema = z.object({
  subject: exportSubjectSchema,
  subjectId: idSchema,
  file: exportFileSchema,
});
