import { z } from 'zod';
import { emailSchema, idSchema, personNameSchema, roleSchema, timestampSchema } from './common';

export const passwordSchema = z
  .string()
  .min(10, 'A password has at least 10 characters.')
  .max(200, 'A password has at most 200 characters.');

/** POST /api/account/password-reset — always answers 202, whether or not the address is known. */
export const passwordResetRequestSchema = z.object({ email: emailSchema });
/** POST /api/account/password-reset/[token] */
export const passwordResetSchema = z.object({ password: passwordSchema });

/** GET /api/account */
export const accountSchema = z.object({
  id: idSchema,
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  organisation: z.object({ id: idSchema, name: z.string() }),
});
export type Account = z.infer<typeof accountSchema>;

/** GET /api/members */
export const memberSchema = z.object({
  id: idSchema,
  userId: idSchema,
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  /** Projects a viewer may look at; empty for every other role, which sees all. */
  projectIds: z.array(idSchema),
  joinedAt: timestampSchema,
});
export type Member = z.infer<typeof memberSchema>;
export const membersSchema = z.object({ members: z.array(memberSchema) });

/** PATCH /api/members/[memberId] */
export const memberChangeSchema = z.object({
  role: roleSchema.optional(),
  projectIds: z.array(idSchema).max(500).optional(),
});

/** POST /api/invitations, GET /api/invitations */
export const invitationRequestSchema = z.object({
  email: emailSchema,
  role: roleSchema,
  projectIds: z.array(idSchema).max(500).default([]),
});
export const invitationSchema = z.object({
  id: idSchema,
  email: z.string(),
  role: roleSchema,
  projectIds: z.array(idSchema),
  expiresAt: timestampSchema,
  acceptedAt: timestampSchema.nullable(),
});
export type Invitation = z.infer<typeof invitationSchema>;
export const invitationsSchema = z.object({ invitations: z.array(invitationSchema) });

/** GET /api/invitations/accept/[token]: what the invited person sees before a password is set. */
export const invitationPreviewSchema = z.object({ email: z.string(), role: roleSchema, organisationName: z.string() });
/** POST /api/invitations/accept/[token] */
export const invitationAcceptSchema = z.object({ name: personNameSchema, password: passwordSchema });
