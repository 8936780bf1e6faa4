import { z } from 'zod';
import { placed, pointMm } from './common';

export const guardLineSchema = z.object({
  kind: z.literal('guardLine'),
  ...placed,
  pointsMm: z.array(pointMm).min(2, 'A guard line needs at least two points.').max(200),
  closed: z.boolean().default(true),
  heightMm: z.number().min(0).max(20_000).default(2000),
});

export const walkwaySchema = z.object({
  kind: z.literal('walkway'),
  ...placed,
  pointsMm: z.array(pointMm).min(2, 'A walkway needs at least two points.').max(200),
  widthMm: z.number().positive('A walkway has a width above zero.').max(20_000),
});

export type GuardLine = z.infer<typeof guardLineSchema>;
export type Walkway = z.infer<typeof walkwaySchema>;
