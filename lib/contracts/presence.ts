import { z } from 'zod';
import { millimetres } from '@/lib/layout/items/common';
import { idSchema } from './common';

const spot = z.object({ xMm: millimetres, yMm: millimetres });
/** A cursor with more than so many things in hand is shown with the first of them. */
const itemIds = z.array(idSchema).max(50);

/** POST /api/layouts/[layoutId]/presence: where this planner is on the sheet; answered with where the others are. */
export const presenceReportSchema = z.object({
  /** One opened page, made by the browser. */
  seat: idSchema,
  /** The pointer on the floor; null while it is elsewhere. */
  at: spot.nullable(),
  /** What is chosen. */
  itemIds,
  /** The page is being left. */
  leaving: z.boolean().default(false),
});
export type PresenceReport = z.input<typeof presenceReportSchema>;

export const otherPlannerSchema = z.object({ seat: idSchema, name: z.string(), at: spot.nullable(), itemIds });
export type OtherPlanner = z.infer<typeof otherPlannerSchema>;

export const presenceAnswerSchema = z.object({
  /** Newer than what one holds: ask for the changes. */
  layoutVersion: z.number().int(),
  others: z.array(otherPlannerSchema),
});
export type PresenceAnswer = z.infer<typeof presenceAnswerSchema>;
