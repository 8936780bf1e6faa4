import { z } from 'zod';
import { itemName, millimetres } from './common';
import { toolAim } from './task-point';

/** Every place is judged after each move, so their number is bounded. */
export const MAX_PLACES = 500;

const count = z.number().int('Write a whole number.').min(1, 'Write 1 or more.').max(100, 'At most 100.');

/**
 * Places in rows, columns and layers, such as a tray or a pallet has them. The first place is given in the fixture's frame (z above
 * the floor); columns follow along the fixture's x, rows along its y, layers upwards.
 */
export const taskPatternSchema = z
  .object({
    id: z.uuid(),
    name: itemName,
    /** The robot that shall do it; null: the one that does best at its worst place. */
    robotId: z.uuid().nullable().default(null),
    xMm: millimetres,
    yMm: millimetres,
    zMm: millimetres,
    ...toolAim,
    rows: count.default(1),
    columns: count.default(1),
    layers: count.default(1),
    pitchXMm: millimetres.default(100),
    pitchYMm: millimetres.default(100),
    pitchZMm: millimetres.default(100),
    /** Wanted tool speed in every direction, mm/s; null: none asked. */
    speedMmS: z.number().positive('A wanted speed is above zero.').max(20_000).nullable().default(null),
    dwellS: z.number().min(0).max(3600).default(0),
    /** How the places are numbered: each row from its first column on, or forth and back. */
    numbering: z.enum(['rows', 'snake']).default('rows'),
    order: z.number().int().min(0).max(10_000).default(0),
  })
  .refine(({ rows, columns, layers }) => rows * columns * layers <= MAX_PLACES, {
    path: ['rows'],
    message: `A pattern has at most ${MAX_PLACES} places. Write fewer rows, columns or layers.`,
  });

export type TaskPattern = z.infer<typeof taskPatternSchema>;
