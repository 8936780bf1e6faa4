import { z } from 'zod';
import { idSchema, roleSchema, timestampSchema } from './common';

/** POST /api/tokens; GET there lists one's own, DELETE /api/tokens/[tokenId] takes one back. */
export const apiTokenRequestSchema = z.object({
  name: z.string().trim().min(1, 'Say what the token is for.').max(120, 'At most 120 characters.'),
  /** Not above the role of whoever makes it. */
  role: roleSchema,
  /** May fetch, but change nothing. */
  readOnly: z.boolean().default(true),
  expiresInDays: z.number().int().min(1).max(365).default(90),
});
export type ApiTokenRequest = z.infer<typeof apiTokenRequestSchema>;

export const apiTokenSchema = z.object({
  id: idSchema,
  name: z.string(),
  /** Its first characters; the token itself is shown once and not kept. */
  hint: z.string(),
  role: roleSchema,
  readOnly: z.boolean(),
  expiresAt: timestampSchema,
  revokedAt: timestampSchema.nullable(),
  lastUsedAt: timestampSchema.nullable(),
  createdAt: timestampSchema,
});
export type ApiToken = z.infer<typeof apiTokenSchema>;
export const apiTokenListSchema = z.object({ tokens: z.array(apiTokenSchema) });
/** Only the answer to POST bears the token. */
export const newApiTokenSchema = apiTokenSchema.extend({ token: z.string() });
export type NewApiToken = z.infer<typeof newApiTokenSchema>;
