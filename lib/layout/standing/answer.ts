import { z } from 'zod';
import { VERDICT_BANDS } from '../verdict-words';

/** What a finished study says. Millimetres and degrees, floor frame; areas in m². */

/** Values of the standing map below zero. */
export const NOT_REACHED = -1;
export const BLOCKED = -2;

const pointOutcomeSchema = z.object({
  band: z.enum(VERDICT_BANDS),
  reached: z.boolean(),
  met: z.boolean(),
  inverseConditionNumber: z.number().nullable(),
  sureSpeedMmS: z.number().nullable(),
});

const standSchema = z.object({
  xMm: z.number(),
  yMm: z.number(),
  angleDeg: z.number(),
  riserMm: z.number(),
  /** Worst inverse condition number over the points; null where one is not reached. */
  worst: z.number().nullable(),
  reachedCount: z.number().int(),
  metCount: z.number().int(),
  blocked: z.boolean(),
  /** In the order of the question. */
  points: z.array(pointOutcomeSchema),
});

export const standingAnswerSchema = z.object({
  study: z.literal('standing'),
  /** Row by row: the worst inverse condition number over the points at the best turn and riser; or NOT_REACHED, BLOCKED. */
  values: z.array(z.number()),
  /** The turn and riser of each value: turn index × number of risers + riser index. */
  stances: z.array(z.number().int()),
  /** Floor from which every point is reached. */
  feasibleAreaM2: z.number(),
  drawn: standSchema,
  /** Null where no place reaches every point. */
  best: standSchema.nullable(),
});

export const toleranceAnswerSchema = z.object({
  study: z.literal('tolerance'),
  trials: z.number().int(),
  /** Trials in which every point that is reached as drawn keeps its verdict. */
  kept: z.number().int(),
  share: z.number(),
  /** Where the true share lies with 95 %. */
  interval: z.tuple([z.number(), z.number()]),
  /** In the order of the question: trials in which the point keeps its verdict; null where it is not reached as drawn. */
  keptByPoint: z.array(z.number().int().nullable()),
});

export const errorGainAnswerSchema = z.object({
  study: z.literal('errorGain'),
  /** Row by row: how far the tool point may be off, mm; or NOT_REACHED. */
  values: z.array(z.number()),
  /** Least, median and most of the floor that is reached, mm; null where nothing is. */
  least: z.number().nullable(),
  median: z.number().nullable(),
  most: z.number().nullable(),
});

export const studyAnswerSchema = z.discriminatedUnion('study', [
  standingAnswerSchema,
  toleranceAnswerSchema,
  errorGainAnswerSchema,
]);

export type PointOutcome = z.infer<typeof pointOutcomeSchema>;
export type Stand = z.infer<typeof standSchema>;
export type StandingAnswer = z.infer<typeof standingAnswerSchema>;
export type ToleranceAnswer = z.infer<typeof toleranceAnswerSchema>;
export type ErrorGainAnswer = z.infer<typeof errorGainAnswerSchema>;
export type StudyAnswer = z.infer<typeof studyAnswerSchema>;
