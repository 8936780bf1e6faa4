import { z } from 'zod';
import { itemName, millimetres, placed, pointMm } from './common';

/** A door in a guard line. */
export const doorSchema = z.object({
  id: z.uuid(),
  name: itemName.default('Door'),
  /** From the line's first point, along the line, to where the opening begins. */
  alongMm: millimetres.min(0, 'A door stands 0 mm or more from the first corner.'),
  widthMm: z.number().positive('A door has a width above zero.').max(20_000, 'At most 20000 mm wide.'),
  kind: z.enum(['hinged-in', 'hinged-out', 'sliding']).default('hinged-out'),
  /** The side of the hinge, or where a sliding leaf goes: where the opening begins, or where it ends. */
  hinge: z.enum(['start', 'end']).default('start'),
});

export const guardLineSchema = z.object({
  kind: z.literal('guardLine'),
  ...placed,
  pointsMm: z
    .array(pointMm)
    .min(2, 'A guard line needs at least two points.')
    .max(200, 'A guard line has at most 200 points. Delete one first.'),
  closed: z.boolean().default(true),
  heightMm: z.number().min(0).max(20_000).default(2000),
  doors: z.array(doorSchema).max(50, 'A guard line has at most 50 doors.').default([]),
});

export const walkwaySchema = z.object({
  kind: z.literal('walkway'),
  ...placed,
  pointsMm: z
    .array(pointMm)
    .min(2, 'A walkway needs at least two points.')
    .max(200, 'A walkway has at most 200 points. Delete one first.'),
  widthMm: z.number().positive('A walkway has a width above zero.').max(20_000),
});

export type Door = z.infer<typeof doorSchema>;
export type GuardLine = z.infer<typeof guardLineSchema>;
export type Walkway = z.infer<typeof walkwaySchema>;
