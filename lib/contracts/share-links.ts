import { z } from 'zod';
import { idSchema, timestampSchema } from './common';
import { revisionSchema } from './revisions';

/** POST /api/revisions/[revisionId]/share-links; GET there lists them, DELETE /api/share-links/[shareLinkId] revokes one. */
export const shareLinkRequestSchema = z.object({
  label: z.string().trim().max(120).default(''),
  mayRemark: z.boolean().default(true),
  maySign: z.boolean().default(false),
  expiresInDays: z.number().int().min(1).max(365).default(30),
});
export type ShareLinkRequest = z.infer<typeof shareLinkRequestSchema>;
export const shareLinkSchema = z.object({
  id: idSchema,
  revisionId: idSchema,
  label: z.string(),
  mayRemark: z.boolean(),
  maySign: z.boolean(),
  expiresAt: timestampSchema,
  revokedAt: timestampSchema.nullable(),
  lastOpenedAt: timestampSchema.nullable(),
  openCount: z.number().int(),
  createdAt: timestampSchema,
  /** The last openings, newest first. `who` is null where the browser has not written by this link before. */
  opens: z.array(
    z.object({
      openedAt: timestampSchema,
      who: z.string().nullable(),
      device: z.enum(['phone', 'tablet', 'computer', 'program']),
    }),
  ),
});
export type ShareLink = z.infer<typeof shareLinkSchema>;
/** Only the answer to POST bears the address: the token itself is not kept. */
export const newShareLinkSchema = shareLinkSchema.extend({ url: z.url() });
export const shareLinkListSchema = z.object({ shareLinks: z.array(shareLinkSchema) });

/**
 * GET /api/share/[token]: the revision behind a link. Its pictures and maps: GET /api/share/[token]/picture?width=… and
 * GET /api/share/[token]/maps/[mapId] and …/maps/[mapId]/tiles. An unknown, expired or revoked token answers 404.
 */
export const sharedRevisionSchema = z.object({
  organisationName: z.string(),
  customerName: z.string(),
  mayRemark: z.boolean(),
  maySign: z.boolean(),
  expiresAt: timestampSchema,
  /** Of a newer revision, where one has been issued meanwhile. */
  newerNumber: z.number().int().nullable(),
  revision: revisionSchema,
});
export type SharedRevision = z.infer<typeof sharedRevisionSchema>;
