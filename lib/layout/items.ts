import { z } from 'zod';
import { outlineFault } from './geometry';

/**
 * The things that stand on a sheet. Millimetres and degrees, floor frame: x right, y away, z up, angles counter-clockwise.
 * Every item has a place and a turn; points of outlines and lines are in the item's own frame.
 */

/** A value on the floor: finite, and no farther off than a large hall (1 km). */
const millimetres = z.number().min(-1_000_000).max(1_000_000);
const degrees = z.number().min(-360).max(360);
const pointMm = z.tuple([millimetres, millimetres]);
const name = z
  .string()
  .trim()
  .min(1, 'Give it a name.')
  .max(80, 'A name has at most 80 characters.')
  .regex(/^\P{Cc}*$/u, 'A name has no line breaks and no control characters.');

const placed = {
  id: z.uuid(),
  name,
  xMm: millimetres,
  yMm: millimetres,
  angleDeg: degrees,
  locked: z.boolean().default(false),
  hidden: z.boolean().default(false),
  /** Place in the list of items and from bottom to top on the sheet; items without one come first. */
  order: z.number().min(-1_000_000).max(1_000_000).optional(),
};

const outline = z
  .array(pointMm)
  .min(3, 'An outline needs at least three corners.')
  .max(200)
  .superRefine((points, context) => {
    const fault = points.length < 3 ? null : outlineFault(points);
    if (fault !== null) context.addIssue({ code: 'custom', message: fault });
  });
const heightRange = {
  zFromMm: millimetres.default(0),
  zToMm: millimetres,
};

/** The tool on a robot: offset of the tool point in the flange frame and a rotation about fixed x, y, z. */
export const toolSchema = z.object({
  name: name.default('Tool'),
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

/**
 * A tool pose that the work needs, in its fixture's frame; z is above the floor.
 * The tool points straight down at tilt 0, level at tilt 90, straight up at 180; azimuth is the heading it tilts to.
 */
export const taskPointSchema = z.object({
  id: z.uuid(),
  name,
  xMm: millimetres,
  yMm: millimetres,
  zMm: millimetres,
  tiltDeg: z.number().min(0).max(180).default(0),
  azimuthDeg: degrees.default(0),
  rollDeg: z.union([degrees, z.literal('free')]).default('free'),
  /** Wanted tool speed in every direction, mm/s; null: none asked. */
  speedMmS: z.number().positive('A wanted speed is above zero.').max(20_000).nullable().default(null),
  dwellS: z.number().min(0).max(3600).default(0),
  order: z.number().int().min(0).max(10_000).default(0),
});

export const fixtureSchema = z.object({
  kind: z.literal('fixture'),
  ...placed,
  outlineMm: outline,
  ...heightRange,
  taskPoints: z.array(taskPointSchema).max(200).default([]),
});

export const obstacleSchema = z.object({ kind: z.literal('obstacle'), ...placed, outlineMm: outline, ...heightRange });

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

export const dimensionSchema = z.object({
  kind: z.literal('dimension'),
  ...placed,
  /** The two measured points, and how far the dimension line stands off them (to the left of from → to). */
  fromMm: pointMm,
  toMm: pointMm,
  offsetMm: millimetres.default(0),
});

export const itemSchema = z.discriminatedUnion('kind', [
  robotSchema,
  fixtureSchema,
  obstacleSchema,
  guardLineSchema,
  walkwaySchema,
  dimensionSchema,
]);

export type Tool = z.infer<typeof toolSchema>;
export type Robot = z.infer<typeof robotSchema>;
export type TaskPoint = z.infer<typeof taskPointSchema>;
export type Fixture = z.infer<typeof fixtureSchema>;
export type Obstacle = z.infer<typeof obstacleSchema>;
export type GuardLine = z.infer<typeof guardLineSchema>;
export type Walkway = z.infer<typeof walkwaySchema>;
export type Dimension = z.infer<typeof dimensionSchema>;
export type Item = z.infer<typeof itemSchema>;
export type ItemKind = Item['kind'];
