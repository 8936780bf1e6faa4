import { z } from 'zod';
import { fixtureSchema, obstacleSchema } from './blocks';
import { conveyorSchema } from './conveyor';
import { dimensionSchema } from './dimension';
import { guardLineSchema, walkwaySchema } from './lines';
import { noteSchema } from './note';
import { protectiveDeviceSchema } from './protective-device';
import { robotSchema } from './robot';
import { sectionLineSchema } from './section-line';
import { zoneSchema } from './zone';

/**
 * The things that stand on a sheet. Millimetres and degrees, floor frame: x right, y away, z up, angles counter-clockwise.
 * Every item has a place and a turn; points of outlines and lines are in the item's own frame.
 */
export const itemSchema = z.discriminatedUnion('kind', [
  robotSchema,
  fixtureSchema,
  obstacleSchema,
  guardLineSchema,
  walkwaySchema,
  conveyorSchema,
  dimensionSchema,
  sectionLineSchema,
  noteSchema,
  zoneSchema,
  protectiveDeviceSchema,
]);

export type Item = z.infer<typeof itemSchema>;
export type ItemKind = Item['kind'];

export { itemName as itemNameSchema } from './common';
export * from './blocks';
export * from './conveyor';
export * from './dimension';
export * from './lines';
export * from './note';
export * from './protective-device';
export * from './robot';
export * from './section-line';
export * from './sequence';
export * from './task-path';
export * from './task-pattern';
export * from './task-point';
export * from './zone';
