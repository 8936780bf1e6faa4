import { z } from 'zod';
import type { Target } from '@/lib/kinematics/types';
import { armSchema } from './arm';

/** The one-shot `analyse` command and its programs' interface: SI units, see README. */

const coordinate = z.number('Write a number.').min(-1e6).max(1e6);
const triple = z.tuple([coordinate, coordinate, coordinate], 'Write three numbers: [x, y, z].');
const direction = triple.refine(([x, y, z]) => Math.hypot(x, y, z) > 1e-9, 'A direction needs a length above zero.');
const poseRow = z.tuple([coordinate, coordinate, coordinate, coordinate], 'Write four numbers a row.');

const poseSchema = z
  .tuple([poseRow, poseRow, poseRow, poseRow], 'A pose has four rows of four numbers.')
  .refine(
    (rows) => isRigid(rows),
    'A pose is a rotation and a shift: three unit rows at right angles, last row 0 0 0 1.',
  );

/** How far a typed rotation may be from a true one: numbers written with seven digits pass. */
const ROTATION_TOLERANCE = 1e-6;

function isRigid(rows: number[][]): boolean {
  const dot = (i: number, j: number) => rows[i][0] * rows[j][0] + rows[i][1] * rows[j][1] + rows[i][2] * rows[j][2];
  for (let i = 0; i < 3; i++)
    for (let j = i; j < 3; j++) if (Math.abs(dot(i, j) - (i === j ? 1 : 0)) > ROTATION_TOLERANCE) return false;
  const [a, b, c] = rows;
  const determinant =
    a[0] * (b[1] * c[2] - b[2] * c[1]) - a[1] * (b[0] * c[2] - b[2] * c[0]) + a[2] * (b[0] * c[1] - b[1] * c[0]);
  const last = rows[3];
  return determinant > 0 && last[0] === 0 && last[1] === 0 && last[2] === 0 && last[3] === 1;
}

const roll = z.union([coordinate, z.literal('free')], 'A roll is a number (rad) or "free".');
const wholePose = z.strictObject({ pose: poseSchema });
const pointAndDirection = z.strictObject({ position: triple, direction, roll });

/** One of the two by its members, so that a refusal names the field that is wrong rather than both shapes. */
export const targetSchema = z
  .looseObject({}, 'A target is { "pose": 4 × 4 rows } or { "position", "direction", "roll" }.')
  .transform((value, context): Target => {
    const checked = ('pose' in value ? wholePose : pointAndDirection).safeParse(value);
    if (checked.success) return checked.data;
    for (const { path, message } of checked.error.issues)
      context.addIssue({ code: 'custom', path: [...path], message, input: value });
    return z.NEVER;
  });

/** At most a million cells: finer grids are a job for the server. */
const MAX_CELLS = 1_000_000;

export const mapRequestSchema = z
  .object({
    grid: z.object({
      origin: z.tuple([coordinate, coordinate]),
      step: z.number().positive('A grid step is above zero.').max(1000),
      columns: z.number().int().min(1).max(MAX_CELLS),
      rows: z.number().int().min(1).max(MAX_CELLS),
    }),
    /** Upright: columns level along this bearing (rad) from the origin, rows up from the tool height. */
    section: z.object({ bearing: coordinate }).optional(),
    toolHeight: coordinate,
    direction: z
      .discriminatedUnion('kind', [
        z.object({ kind: z.literal('down') }),
        z.object({ kind: z.literal('outward'), tilt: coordinate }),
        z.object({ kind: z.literal('vector'), vector: direction }),
      ])
      .default({ kind: 'down' }),
    /** Every sampled direction about the map's own has to be reached; values are the worst of them. Radians. */
    cone: z
      .object({
        halfAngle: z.number().positive('A cone opens by more than zero.').max(Math.PI, 'A cone opens by at most π.'),
        samples: z.number().int().min(1).max(1000).default(24),
      })
      .optional(),
    roll: roll.default('free'),
    wrist: z.enum(['held', 'free']).default('held'),
    branch: z.string().default('best'),
  })
  .refine(({ grid }) => grid.columns * grid.rows <= MAX_CELLS, {
    path: ['grid'],
    message: `A map has at most ${MAX_CELLS.toLocaleString('en')} cells here; take a larger step.`,
  });

const seconds = z.number('Write a time (s).').min(0, 'A time is 0 s or more.').max(36_000);

/** A move to a target, or a wait; the last step leads back to the first. */
const sequenceStepSchema = z.union(
  [
    z.strictObject({
      target: targetSchema,
      motion: z.enum(['joint', 'straight']).default('joint'),
      via: z.array(triple).max(20).default([]),
      dwell: seconds.default(0),
    }),
    z.strictObject({ wait: seconds }),
  ],
  'A step is { "target", "motion"?, "via"?, "dwell"? } or { "wait": seconds }.',
);
export const analyseSequenceSchema = z.object({
  steps: z.array(sequenceStepSchema).min(1, 'A sequence has at least one step.').max(300),
});
export type AnalyseSequence = z.infer<typeof analyseSequenceSchema>;

export const analyseRequestSchema = z
  .object({
    arm: armSchema,
    postures: z.array(z.array(coordinate)).max(100_000).optional(),
    targets: z.array(targetSchema).max(100_000).optional(),
    map: mapRequestSchema.optional(),
    sequence: analyseSequenceSchema.optional(),
  })
  .superRefine(({ arm, postures }, context) => {
    const values = arm.coupling?.[0]?.length ?? arm.joints.length;
    postures?.forEach((posture, index) => {
      if (posture.length !== values)
        context.addIssue({
          code: 'custom',
          path: ['postures', index],
          message: `This arm takes ${values} joint values a posture; ${posture.length} are given.`,
          input: posture,
        });
    });
  });
export type AnalyseRequest = z.infer<typeof analyseRequestSchema>;

const rows = z.array(z.array(z.number()));
const measures = z.object({
  gains: z.array(z.number()).nullable(),
  inverseConditionNumber: z.number().nullable(),
  manipulability: z.number().nullable(),
  ellipsoidSpeed: z.number().nullable(),
  maximumToolSpeed: z.number().nullable(),
  sureSpeed: z.number().nullable(),
});

/** What `analyse` prints; each member only where it was asked for. */
export const analyseAnswerSchema = z.object({
  postures: z
    .array(
      z.object({
        pose: rows,
        jacobian: rows,
        wristFree: measures,
        wristHeld: measures,
        limitMargin: z.object({ joint: z.number().int(), angle: z.number(), share: z.number() }),
      }),
    )
    .optional(),
  targets: z.array(z.object({ reached: z.boolean(), reason: z.string().nullable(), solutions: rows })).optional(),
  sequence: z
    .object({
      /** From the last step round to the last step, s; an estimate. */
      time: z.number(),
      steps: z.array(
        z.object({
          reached: z.boolean(),
          reason: z.string().nullable(),
          motion: z.enum(['joint', 'straight']).nullable(),
          moveTime: z.number(),
          hold: z.number(),
          /** From 1. */
          slowestJoint: z.number().int().nullable(),
          branch: z.string(),
          posture: z.array(z.number()).nullable(),
          crossings: z.array(
            z.object({ from: z.number(), to: z.number(), joint: z.number().int().nullable(), speed: z.number() }),
          ),
        }),
      ),
    })
    .optional(),
  map: z
    .object({
      columns: z.number().int(),
      rows: z.number().int(),
      /** Row by row: a word of REASONS a cell, then values with null where not reached. */
      reason: z.array(z.string()),
      bindingJoint: z.array(z.number().int().nullable()),
      branch: z.array(z.string().nullable()),
      inverseConditionNumber: z.array(z.number().nullable()),
      maximumToolSpeed: z.array(z.number().nullable()),
      sureSpeed: z.array(z.number().nullable()),
      limitShare: z.array(z.number().nullable()),
      wristCoverage: z.array(z.number()),
      summary: z.object({
        reachedAreaM2: z.number(),
        bestInverseConditionNumber: z.number().nullable(),
        fastestToolSpeed: z.number().nullable(),
      }),
    })
    .optional(),
});
export type AnalyseAnswer = z.infer<typeof analyseAnswerSchema>;
