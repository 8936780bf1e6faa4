import { z } from 'zod';
import { itemName, millimetres } from './common';

const seconds = z.number().min(0, 'A time is 0 s or more.').max(3600, 'At most 3600 s.');
const point3 = z.tuple([millimetres, millimetres, millimetres]);

/** How the robot gets there: every joint its own shortest way, or the tool point along straight lines. */
const approach = {
  motion: z.enum(['joint', 'straight']).default('joint'),
  /** Points that a straight move passes on its way, in the floor frame (x, y, z above the floor). */
  viaMm: z.array(point3).max(20, 'At most 20 points on the way.').default([]),
};

/** One step of a robot's cycle. A step whose target is gone from the sheet stays, and is named where the cycle is told. */
export const sequenceStepSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('point'),
    id: z.uuid(),
    fixtureId: z.uuid(),
    /** A task point of the fixture, or one of its patterns. */
    taskPointId: z.uuid(),
    /** Which place of the pattern, counted from 1; null for a task point. */
    place: z.number().int().min(1).max(500).nullable().default(null),
    ...approach,
  }),
  z.object({ kind: z.literal('path'), id: z.uuid(), fixtureId: z.uuid(), taskPathId: z.uuid(), ...approach }),
  z.object({
    kind: z.literal('wait'),
    id: z.uuid(),
    cause: z.enum(['grip', 'handshake', 'process']).default('grip'),
    name: itemName.default('Grip'),
    seconds,
  }),
  z.object({ kind: z.literal('zone'), id: z.uuid(), zoneId: z.uuid(), action: z.enum(['enter', 'leave']) }),
]);

export type SequenceStep = z.infer<typeof sequenceStepSchema>;
export type SequenceStepKind = SequenceStep['kind'];
