import { z } from 'zod';
import { degrees, itemName, millimetres, placed } from './common';

/** The tool on a robot: offset of the tool point in the flange frame and a rotation about fixed x, y, z. */
export const toolSchema = z.object({
  name: itemName.default('Tool'),
  xMm: millimetres.default(0),
  yMm: millimetres.default(0),
  zMm: millimetres.default(0),
  rollDeg: degrees.default(0),
  pitchDeg: degrees.default(0),
  yawDeg: degrees.default(0),
  massKg: z.number().min(0).max(5000).default(0),
});

export const robotSchema = z.object({
  kind: z.literal('robot'),
  ...placed,
  /** One frozen version of an arm of the library. */
  armId: z.uuid(),
  riserMm: z.number().min(0).max(20_000).default(0),
  tool: toolSchema.prefault({}),
});

export type Tool = z.infer<typeof toolSchema>;
export type Robot = z.infer<typeof robotSchema>;
