import { z } from 'zod';
import { placed, pointMm } from './common';

const lengthMm = z.number().min(0, 'A length is 0 mm or more.').max(20_000, 'At most 20000 mm.');
const seconds = z.number().min(0, 'A time is 0 s or more.').max(60, 'At most 60 s.');
const approachMmS = z.number().positive('An approach speed is above zero.').max(10_000, 'At most 10000 mm/s.');

/**
 * A light curtain, scanner field or the like, drawn as the line at which it notices somebody. Whatever is not known stays null:
 * the distance is then not told, and the question is asked at the field.
 */
export const protectiveDeviceSchema = z.object({
  kind: z.literal('protectiveDevice'),
  ...placed,
  pointsMm: z.array(pointMm).min(2, 'A protective device needs at least two points.').max(200),
  /** A curtain is walked into at right angles; a field lies along the way that people come. */
  form: z.enum(['curtain', 'field']).default('curtain'),
  edition: z.enum(['2010', '2024']).default('2010'),
  /** From the signal to standstill, as measured on the machine. */
  stopS: seconds.nullable().default(null),
  /** From somebody's coming to the signal: the device and the control behind it. */
  responseS: seconds.nullable().default(null),
  /** Smallest body that the device notices for certain, d. */
  detectionMm: lengthMm.nullable().default(null),
  /** Height of a parallel field above the floor, H. */
  fieldHeightMm: lengthMm.nullable().default(null),
  /** Approach speeds K of the standard: quick (arms) and slow (walking). */
  fastMmS: approachMmS.default(2000),
  slowMmS: approachMmS.default(1600),
  /** Reaching over, C of the table that the user holds a copy of. */
  reachOverMm: lengthMm.nullable().default(null),
  /** Supplement of the 2024 edition, from the user's copy. */
  supplementMm: lengthMm.nullable().default(null),
  /** C as the user found it, in place of the formula's. */
  ownAddedMm: lengthMm.nullable().default(null),
});

export type ProtectiveDevice = z.infer<typeof protectiveDeviceSchema>;
