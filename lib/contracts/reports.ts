import { z } from 'zod';
import { idSchema, timestampSchema } from './common';
import { exportSubjectSchema } from './exports';
import { layoutStateSchema } from './layouts';
import { snapshotSchema } from './revisions';

export const REPORT_SCALES = [20, 50, 100] as const;

/** POST /api/reports: the report is made by a job; poll GET /api/reports/[reportId]. */
export const reportOptionsSchema = z.object({
  kind: z.enum(['pdf', 'png']).default('pdf'),
  paper: z.enum(['A4', 'A3']).default('A4'),
  /** 1 mm on paper for so many on the floor; `fit` takes the largest usual scale that fits the page. */
  scale: z.union([z.literal(REPORT_SCALES), z.literal('fit')]).default('fit'),
  /** Colours of the map, or greys for a printer without. */
  mapScale: z.enum(['tide', 'plum', 'grey']).default('tide'),
  floorPlan: z.boolean().default(true),
  /** Another sheet of the project to set beside this one. */
  compareWith: z.object({ subject: exportSubjectSchema, subjectId: idSchema }).nullable().default(null),
});
export type ReportOptions = z.infer<typeof reportOptionsSchema>;

export const reportRequestSchema = z.object({
  subject: exportSubjectSchema,
  subjectId: idSchema,
  options: reportOptionsSchema.prefault({}),
});
export type ReportRequest = z.infer<typeof reportRequestSchema>;

export const reportStateSchema = z.enum(['queued', 'running', 'done', 'failed']);
export type ReportState = z.infer<typeof reportStateSchema>;

/** A sheet with what its title block says. */
export const reportedSheetSchema = z.object({
  snapshot: snapshotSchema,
  siteName: z.string(),
  /** Null for a draft. */
  revision: z
    .object({
      id: idSchema,
      number: z.number().int(),
      state: layoutStateSchema,
      note: z.string(),
      sha256: z.string(),
      issuedAt: timestampSchema,
      issuedBy: z.string(),
    })
    .nullable(),
});
export type ReportedSheet = z.infer<typeof reportedSheetSchema>;

/** All that a report says, frozen when it was asked for. */
export const reportInputSchema = z.object({
  organisationName: z.string(),
  askedBy: z.string(),
  askedAt: timestampSchema,
  sheet: reportedSheetSchema,
  compared: reportedSheetSchema.nullable(),
  /** Who accepted or refused the revision. */
  signatures: z.array(
    z.object({
      decision: z.enum(['accepted', 'changes_requested']),
      /** Without the address: a report goes farther than the people whom it concerns. */
      name: z.string(),
      note: z.string(),
      sha256: z.string(),
      signedAt: timestampSchema,
    }),
  ),
});
export type ReportInput = z.infer<typeof reportInputSchema>;

/** GET /api/reports/[reportId]; the file itself: GET /api/reports/[reportId]/file once the state is `done`. */
export const reportSchema = z.object({
  id: idSchema,
  layoutId: idSchema,
  revisionId: idSchema.nullable(),
  options: reportOptionsSchema,
  state: reportStateSchema,
  progress: z.object({ done: z.number().int(), total: z.number().int() }),
  failure: z.string().nullable(),
  fileName: z.string(),
  bytes: z.number().int().nullable(),
  pages: z.number().int().nullable(),
  sha256: z.string().nullable(),
  askedBy: z.string(),
  askedAt: timestampSchema,
  finishedAt: timestampSchema.nullable(),
});
export type Report = z.infer<typeof reportSchema>;
export const reportListSchema = z.object({ reports: z.array(reportSchema) });

/** GET /api/reports?subject=revisions&subjectId=… */
export const reportListQuerySchema = z.object({ subject: exportSubjectSchema, subjectId: idSchema });
