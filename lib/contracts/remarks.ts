import { z } from 'zod';
import { emailSchema, idSchema, personNameSchema, timestampSchema } from './common';

const body = z
  .string()
  .trim()
  .min(1, 'Write what you want to say.')
  .max(4000, 'A remark has at most 4,000 characters.');

/** Members named with an @ in the text; they get a mail. */
const mentions = z.array(idSchema).max(20).default([]);

/** A guest on a share link says who they are; a signed-in member leaves it out. */
export const guestSchema = z.object({ name: personNameSchema, email: emailSchema });
export type Guest = z.infer<typeof guestSchema>;

/** POST /api/revisions/[revisionId]/remarks; with `guest` also POST /api/share/[token]/remarks */
export const remarkRequestSchema = z.object({
  xMm: z.number().min(-1_000_000).max(1_000_000),
  yMm: z.number().min(-1_000_000).max(1_000_000),
  itemId: idSchema.nullable().default(null),
  body,
  mentions,
});
/** Guests do not know who the members are, so they name nobody. */
export const guestRemarkRequestSchema = remarkRequestSchema.omit({ mentions: true }).extend({ guest: guestSchema });
export type RemarkRequest = z.infer<typeof remarkRequestSchema>;
/** POST /api/remarks/[remarkId]/replies and POST /api/share/[token]/remarks/[remarkId]/replies */
export const replyRequestSchema = z.object({ body, mentions });
export type ReplyRequest = z.infer<typeof replyRequestSchema>;
export const guestReplyRequestSchema = replyRequestSchema.omit({ mentions: true }).extend({ guest: guestSchema });
/** PATCH /api/remarks/[remarkId]: settle or reopen, give it to a planner (null: to nobody), until a day. What is left out stays. */
export const remarkChangeSchema = z.object({
  resolved: z.boolean().optional(),
  assigneeId: idSchema.nullable().optional(),
  dueOn: z.iso.date('Write the day as 2026-12-24.').nullable().optional(),
});
export type RemarkChange = z.infer<typeof remarkChangeSchema>;

/** GET /api/projects/[projectId]/people: who can be named in a remark; only planners can be given one. */
export const personSchema = z.object({ id: idSchema, name: z.string(), side: z.enum(['integrator', 'customer']) });
export type Person = z.infer<typeof personSchema>;
export const peopleSchema = z.object({ people: z.array(personSchema) });

/**
 * POST /api/remarks/[remarkId]/pictures and /api/share/[token]/remarks/[remarkId]/pictures: a multipart form with one `file`, from
 * whoever wrote the remark. GET …/pictures/[pictureId] there answers the picture.
 */
export const REMARK_PICTURE_MAX_BYTES = 12 * 1024 * 1024;
export const REMARK_PICTURES_MAX = 4;
export const remarkPictureSchema = z.object({ id: idSchema, widthPx: z.number().int(), heightPx: z.number().int() });

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
  mentions: z.array(z.string()),
  createdAt: timestampSchema,
});
export const remarkSchema = z.object({
  id: idSchema,
  revisionId: idSchema,
  /** Where it was pinned; open ones are carried forward to later revisions of the layout. */
  revisionNumber: z.number().int(),
  layoutId: idSchema,
  /** Letter and name as issued. */
  layoutTitle: z.string(),
  /** Shown in the pin; counts within the layout. */
  number: z.number().int().min(1),
  xMm: z.number(),
  yMm: z.number(),
  itemId: idSchema.nullable(),
  author: authorSchema,
  body: z.string(),
  resolvedAt: timestampSchema.nullable(),
  /** The planner whose it is to deal with, and until when. */
  assignee: z.object({ id: idSchema, name: z.string() }).nullable(),
  dueOn: z.iso.date().nullable(),
  /** Names of the members named in it. */
  mentions: z.array(z.string()),
  pictures: z.array(remarkPictureSchema),
  /** Something in it was written by somebody else since the reader last opened it; false for guests. */
  unread: z.boolean(),
  createdAt: timestampSchema,
  replies: z.array(replySchema),
});
export type Remark = z.infer<typeof remarkSchema>;
/** GET /api/projects/[projectId]/remarks, /api/layouts/[layoutId]/remarks, /api/revisions/[revisionId]/remarks, /api/share/[token]/remarks */
export const remarkListSchema = z.object({ remarks: z.array(remarkSchema) });
