import { z } from 'zod';
import { degrees, itemName, millimetres } from './common';

/**
 * How the tool is held. It points straight down at tilt 0, level at tilt 90, straight up at 180; azimuth is the heading in the
 * fixture's frame that it tilts to.
 */
export const toolAim = {
  tiltDeg: z.number().min(0).max(180).default(0),
  azimuthDeg: degrees.default(0),
  rollDeg: z.union([degrees, z.literal('free')]).default('free'),
};

/** A tool pose that the work needs, in its fixture's frame; z is above the floor. */
export const taskPointSchema = z.object({
  id: z.uuid(),
  name: itemName,
  /** The robot that shall do it; null: the one that does best. */
  robotId: z.uuid().nullable().default(null),
  xMm: millimetres,
  yMm: millimetres,
  zMm: millimetres,
  ...toolAim,
  /** Wanted tool speed in every direction, mm/s; null: none asked. */
  speedMmS: z.number().positive('A wanted speed is above zero.').max(20_000).nullable().default(null),
  dwellS: z.number().min(0).max(3600).default(0),
  order: z.number().int().min(0).max(10_000).default(0),
});

export type TaskPoint = z.infer<typeof taskPointSchema>;
