import { z } from 'zod';
import { placed } from './common';

/** Words on the floor. Its place is the upper left corner of the first line. */
export const noteSchema = z.object({
  kind: z.literal('note'),
  ...placed,
  text: z
    .string()
    .trim()
    .min(1, 'Write the words of the note.')
    .max(1000, 'A note has at most 1000 characters.')
    // Line breaks are welcome, other control characters would only harm drawings made from it.
    .regex(/^(?:\P{Cc}|\n)*$/u, 'A note has no control characters.'),
  /** Height of its capital letters on the floor. */
  sizeMm: z.number().positive('Letters are higher than zero.').max(5000, 'At most 5000 mm high.').default(150),
});

export type Note = z.infer<typeof noteSchema>;
