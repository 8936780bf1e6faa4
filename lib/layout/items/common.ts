import { z } from 'zod';
import { outlineFault } from '../geometry';

/** A value on the floor: finite, and no farther off than a large hall (1 km). */
export const millimetres = z.number().min(-1_000_000).max(1_000_000);
export const degrees = z.number().min(-360).max(360);
export const pointMm = z.tuple([millimetres, millimetres]);
export const itemName = z
  .string()
  .trim()
  .min(1, 'Give it a name.')
  .max(80, 'A name has at most 80 characters.')
  .regex(/^\P{Cc}*$/u, 'A name has no line breaks and no control characters.');

export const placed = {
  id: z.uuid(),
  name: itemName,
  xMm: millimetres,
  yMm: millimetres,
  angleDeg: degrees,
  locked: z.boolean().default(false),
  hidden: z.boolean().default(false),
  /** Place in the list of items and from bottom to top on the sheet; items without one come first. */
  order: z.number().min(-1_000_000).max(1_000_000).optional(),
  /** Items with the same one are chosen, moved and copied together. */
  groupId: z.uuid().optional(),
};

export const outline = z
  .array(pointMm)
  .min(3, 'An outline needs at least three corners.')
  .max(200, 'An outline has at most 200 corners. Delete one first.')
  .superRefine((points, context) => {
    const fault = points.length < 3 ? null : outlineFault(points);
    if (fault !== null) context.addIssue({ code: 'custom', message: fault });
  });
/** Set where the corners of a rectangle move one by one; otherwise it stays a rectangle while it is drawn larger or smaller. */
export const cornersFree = z.boolean().optional();
export const heightRange = {
  zFromMm: millimetres.default(0),
  zToMm: millimetres,
};
