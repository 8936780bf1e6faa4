import { z } from 'zod';
import { emailSchema, idSchema, personNameSchema, timestampSchema } from './common';

const body = z
  .string()
  .trim()
  .min(1, 'Write what you want to say.')
  .max(4000, 'A remark has at most 4,000 characters.');

/** A guest on a share link says who they are; a signed-in member leaves it out. */
export const guestSchema = z.object({ name: personNameSchema, email: emailSchema });
export type Guest = z.infer<typeof guestSchema>;

/** POST /api/revisions/[revisionId]/remarks; with `guest` also POST /api/share/[token]/remarks */
export const remarkRequestSchema = z.object({
  xMm: z.number().min(-1_000_000).max(1_000_000),
  yMm: z.number().min(-1_000_000).max(1_000_000),
  itemId: idSchema.nullable().default(null),
  body,
});
export const guestRemarkRequestSchema = remarkRequestSchema.extend({ guest: guestSchema });
export type RemarkRequest = z.infer<typeof remarkRequestSchema>;
/** POST /api/remarks/[remarkId]/replies and POST /api/share/[token]/remarks/[remarkId]/replies */
export const replyRequestSchema = z.object({ body });
export const guestReplyRequestSchema = replyRequestSchema.extend({ guest: guestSchema });
/** PATCH /api/remarks/[remarkId] */
export const remarkChangeSchema = z.object({ resolved: z.boolean() });

export const authorSchema = z.object({
  name: z.string(),
  /** How the reader should see them. */
  side: z.enum(['integrator', 'customer']),
  /** True for the person who asks. */
  you: z.boolean(),
});
export const replySchema = z.object({
  id: idSchema,
  author: authorSchema,
  body: z.string(),
  createdAt: timestampSchema,
});
export const remarkSchema = z.object({
  id: idSchema,
  revisionId: idSchema,
  revisionNumber: z.number().int(),
  /** Shown in the pin; counts within the layout. */
  number: z.number().int().min(1),
  xMm: z.number(),
  yMm: z.number(),
  itemId: idSchema.nullable(),
  author: authorSchema,
  body: z.string(),
  resolvedAt: timestampSchema.nullable(),
  createdAt: timestampSchema,
  replies: z.array(replySchema),
});
export type Remark = z.infer<typeof remarkSchema>;
/** GET /api/layouts/[layoutId]/remarks, /api/revisions/[revisionId]/remarks, /api/share/[token]/remarks */
export const remarkListSchema = z.object({ remarks: z.array(remarkSchema) });
