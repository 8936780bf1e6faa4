import { z } from 'zod';
import { millimetres, placed, pointMm } from './common';

/** Where the sheet is cut upright: from one end to the other, seen from its right, between two heights. */
export const sectionLineSchema = z.object({
  kind: z.literal('sectionLine'),
  ...placed,
  letter: z.string().regex(/^[A-Z]$/, 'A section is named by one letter from A to Z.'),
  fromMm: pointMm,
  toMm: pointMm,
  zFromMm: millimetres.default(0),
  zToMm: millimetres.default(2500),
});

export type SectionLine = z.infer<typeof sectionLineSchema>;
