import { z } from 'zod';
import { idSchema, timestampSchema } from './common';

const text = z.string().trim().max(120);

/**
 * GET /api/audit?who=…&action=…&subjectId=…&from=…&to=…&before=…: newest first, 100 at a time; for admins. The same filter without
 * paging as CSV: GET /api/audit/csv. A filter left out or empty keeps everything.
 */
export const auditFilterSchema = z.object({
  /** Part of a name or of an e-mail address. */
  who: text.default(''),
  /** Subject, or subject and deed: `revision` or `revision.issued`. */
  action: text.regex(/^[a-z_.]*$/, 'An action has small letters, underscores and one full stop.').default(''),
  subjectId: z.union([idSchema, z.literal('')]).default(''),
  /** Days, both included, in universal time. */
  from: z.union([z.iso.date(), z.literal('')]).default(''),
  to: z.union([z.iso.date(), z.literal('')]).default(''),
});
export type AuditFilter = z.infer<typeof auditFilterSchema>;
export const auditQuerySchema = auditFilterSchema.extend({
  /** `next` of the answer before. */
  before: z.union([z.string().regex(/^\d+_[0-9a-f-]{36}$/), z.literal('')]).default(''),
});
export type AuditQuery = z.infer<typeof auditQuerySchema>;

export const auditEventSchema = z.object({
  id: idSchema,
  at: timestampSchema,
  /** A member's name, the label of a share link, or that of nobody who is still there. */
  who: z.string(),
  email: z.string().nullable(),
  kind: z.enum(['member', 'token', 'guest', 'unknown']),
  action: z.string(),
  subjectId: idSchema.nullable(),
  details: z.record(z.string(), z.unknown()),
});
export type AuditEvent = z.infer<typeof auditEventSchema>;
export const auditPageSchema = z.object({
  events: z.array(auditEventSchema),
  /** Every action that has been written down in this organisation. */
  actions: z.array(z.string()),
  next: z.string().nullable(),
});
export type AuditPage = z.infer<typeof auditPageSchema>;
