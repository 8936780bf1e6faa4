import { z } from 'zod';
import { itemName, millimetres } from './common';
import { toolAim } from './task-point';

/** A point in the fixture's frame; z is above the floor. */
export const point3Schema = z.object({ xMm: millimetres, yMm: millimetres, zMm: millimetres });

/**
 * A seam that the tool follows at one speed and in one direction: straight from corner to corner, or along the arc of a circle
 * through a point on the way. In its fixture's frame; z is above the floor.
 */
export const taskPathSchema = z.object({
  id: z.uuid(),
  name: itemName,
  /** The robot that shall do it; null: the one that does best. */
  robotId: z.uuid().nullable().default(null),
  points: z
    .array(
      point3Schema.extend({
        /** The way that leads to this corner is the arc through here; null: a straight line. */
        arcVia: point3Schema.nullable().default(null),
      }),
    )
    .min(2, 'A path has at least two corners.')
    .max(200, 'A path has at most 200 corners.'),
  ...toolAim,
  /** Wanted speed along the path, mm/s; null: none asked. */
  speedMmS: z.number().positive('A wanted speed is above zero.').max(20_000).nullable().default(null),
  order: z.number().int().min(0).max(10_000).default(0),
});

export type Point3 = z.infer<typeof point3Schema>;
export type TaskPath = z.infer<typeof taskPathSchema>;
export type PathCorner = TaskPath['points'][number];
