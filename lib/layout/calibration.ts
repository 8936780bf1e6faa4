import { z } from 'zod';

/**
 * Where a floor plan lies on the floor. Picture frame: pixels of the upright original, x right, y down from the upper left
 * corner. Floor frame: millimetres, x right, y away (up on screen), origin at `originPx`, turned so that the level line is level.
 */

const pixelPoint = z.tuple([z.number().min(-100_000).max(200_000), z.number().min(-100_000).max(200_000)]);
const distance = z
  .number('Write the distance between the two points.')
  .positive('A distance is above zero.')
  .max(1_000_000);

export const measuredLineSchema = z.object({ fromPx: pixelPoint, toPx: pixelPoint, distanceMm: distance });

export const calibrationRequestSchema = z.object({
  /** Two points of known distance: sets the scale. */
  scale: measuredLineSchema,
  /** A second known distance: tells the error. */
  check: measuredLineSchema.nullable().default(null),
  /** Two points on a line that is level on the floor (left to right): straightens a crooked scan. */
  level: z.object({ fromPx: pixelPoint, toPx: pixelPoint }).nullable().default(null),
  originPx: pixelPoint,
});
export type CalibrationRequest = z.infer<typeof calibrationRequestSchema>;

export const calibrationSchema = calibrationRequestSchema.extend({
  mmPerPx: z.number().positive(),
  /** How far the picture's x axis is turned counter-clockwise against the floor's x axis, degrees. */
  rotationDeg: z.number(),
  /** (measured − stated) / stated of the check distance; null without one. */
  checkError: z.number().nullable(),
});
export type Calibration = z.infer<typeof calibrationSchema>;
