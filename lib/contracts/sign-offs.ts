import { z } from 'zod';
import { idSchema, timestampSchema } from './common';
import { layoutStateSchema } from './layouts';
import { guestSchema } from './remarks';

export const signOffDecisionSchema = z.enum(['accepted', 'changes_requested']);
export type SignOffDecision = z.infer<typeof signOffDecisionSchema>;

/**
 * POST /api/revisions/[revisionId]/sign-offs; with `guest` also POST /api/share/[token]/sign-offs. `sha256` is that of the revision
 * on the signer's screen: another one is answered 409 `other_content`.
 */
export const signOffRequestSchema = z.object({
  decision: signOffDecisionSchema,
  note: z.string().trim().max(4000, 'A note has at most 4,000 characters.').default(''),
  sha256: z.string().regex(/^[0-9a-f]{64}$/, 'Send the hash of the revision that was shown.'),
});
export type SignOffRequest = z.infer<typeof signOffRequestSchema>;
export const guestSignOffRequestSchema = signOffRequestSchema.extend({ guest: guestSchema });

export const signOffSchema = z.object({
  id: idSchema,
  decision: signOffDecisionSchema,
  note: z.string(),
  sha256: z.string().length(64),
  name: z.string(),
  /** Null for readers whom the address does not concern: other guests and viewers. */
  email: z.string().nullable(),
  signedAt: timestampSchema,
});
export type SignOff = z.infer<typeof signOffSchema>;

/** Answer to both, and to GET there: the revision's state now and all sign-offs so far, oldest first. */
export const signOffStateSchema = z.object({ state: layoutStateSchema, signOffs: z.array(signOffSchema) });
export type SignOffState = z.infer<typeof signOffStateSchema>;
