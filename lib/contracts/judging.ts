import { z } from 'zod';
import { VERDICT_BANDS } from '@/lib/layout/verdict-words';
import { idSchema } from './common';

/** Figures of a layout or a revision as the sheet shows them. mm/s, kg, N m, kg m², s; joints count from 1. */

const speed = z.number().nullable();

/** One task point, path or pattern; of a path and a pattern the figures are those of its worst place. */
export const taskVerdictSchema = z.object({
  kind: z.enum(['point', 'path', 'pattern']),
  id: idSchema,
  name: z.string(),
  fixtureId: idSchema,
  assignment: z.enum(['best robot', 'by hand', 'robot gone']),
  /** Null on a sheet without robots; then nothing else is known either. */
  robotId: idSchema.nullable(),
  band: z.enum(VERDICT_BANDS).nullable(),
  reached: z.boolean(),
  met: z.boolean(),
  inverseConditionNumber: z.number().nullable(),
  speedMmS: speed,
  wantedSpeedMmS: speed,
  marginMmS: speed,
  reason: z.string().nullable(),
  notes: z.array(z.string()),
});

const ratedFigureSchema = z.object({ value: z.number(), rated: z.number().nullable(), margin: z.number().nullable() });

export const payloadSchema = z.object({
  robotId: idSchema,
  robotName: z.string(),
  massKg: ratedFigureSchema,
  momentNm: ratedFigureSchema.nullable(),
  inertiaKgM2: ratedFigureSchema.nullable(),
  within: z.boolean().nullable(),
  questions: z.array(
    z.object({ field: z.enum(['toolMass', 'part', 'payload', 'centre', 'inertia', 'rating']), words: z.string() }),
  ),
  caution: z.string(),
});

/** GET /api/layouts/[layoutId]/verdicts, GET /api/revisions/[revisionId]/verdicts. The worst task first. */
export const verdictsAnswerSchema = z.object({
  wrist: z.enum(['held', 'free']),
  tasks: z.array(taskVerdictSchema),
  payloads: z.array(payloadSchema),
  caution: z.string(),
});
export type VerdictsAnswer = z.infer<typeof verdictsAnswerSchema>;

const stepSchema = z.object({
  stepId: idSchema,
  kind: z.enum(['point', 'path', 'wait', 'zone']),
  label: z.string(),
  motion: z.enum(['joint', 'straight']).nullable(),
  moveS: z.number(),
  runS: z.number(),
  holdS: z.number(),
  slowestJoint: z.number().int().nullable(),
  lengthMm: z.number().nullable(),
  leastSpeedMmS: z.number().nullable(),
  crossings: z.array(
    z.object({
      fromMm: z.number(),
      toMm: z.number(),
      joint: z.number().int().nullable(),
      speedMmS: z.number(),
      changesBranch: z.boolean(),
    }),
  ),
  branch: z.string(),
  /** rad, or m for a joint that slides. */
  posture: z.array(z.number()).nullable(),
});

/** GET /api/layouts/[layoutId]/cycle, GET /api/revisions/[revisionId]/cycle. Robots without steps are left out. */
export const cycleAnswerSchema = z.object({
  robots: z.array(
    z.object({
      robotId: idSchema,
      robotName: z.string(),
      /** By itself, and with its waits for shared zones. */
      totalS: z.number(),
      endS: z.number(),
      queuedS: z.number(),
      targetS: z.number().nullable(),
      marginS: z.number().nullable(),
      steps: z.array(stepSchema),
      problems: z.array(
        z.object({ stepId: idSchema, number: z.number().int(), label: z.string(), message: z.string() }),
      ),
    }),
  ),
  stays: z.array(z.object({ zoneId: idSchema, robotId: idSchema, fromS: z.number(), toS: z.number() })),
  endS: z.number(),
  problems: z.array(z.string()),
  caution: z.string(),
});
export type CycleAnswer = z.infer<typeof cycleAnswerSchema>;
