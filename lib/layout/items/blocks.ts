import { z } from 'zod';
import { cornersFree, heightRange, outline, placed } from './common';
import { taskPathSchema } from './task-path';
import { taskPatternSchema } from './task-pattern';
import { taskPointSchema } from './task-point';

export const fixtureSchema = z.object({
  kind: z.literal('fixture'),
  ...placed,
  outlineMm: outline,
  cornersFree,
  ...heightRange,
  taskPoints: z.array(taskPointSchema).max(200).default([]),
  taskPaths: z.array(taskPathSchema).max(50).default([]),
  taskPatterns: z.array(taskPatternSchema).max(50).default([]),
});

export const obstacleSchema = z.object({
  kind: z.literal('obstacle'),
  ...placed,
  outlineMm: outline,
  cornersFree,
  ...heightRange,
  /** A column of the building is drawn as cut; anything else in the way is an obstacle. */
  form: z.enum(['obstacle', 'column']).default('obstacle'),
});

export type Fixture = z.infer<typeof fixtureSchema>;
export type Obstacle = z.infer<typeof obstacleSchema>;
