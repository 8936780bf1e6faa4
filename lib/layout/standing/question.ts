import { z } from 'zod';
import { degrees, millimetres, outline, pointMm } from '../items/common';
import { toolAim } from '../items/task-point';

/**
 * What a study is asked. A question names no item of a sheet, only what its answer depends on, so that the same question from
 * another variant finds the stored answer. Millimetres and degrees, floor frame.
 */

const placement = { xMm: millimetres, yMm: millimetres, angleDeg: degrees };
const riserMm = z.number().min(0).max(20_000);

const workPointSchema = z.object({
  /** Where the fixture stands that carries the point. */
  fixture: z.object(placement),
  /** In the fixture's frame; z is above the floor. */
  xMm: millimetres,
  yMm: millimetres,
  zMm: millimetres,
  ...toolAim,
  speedMmS: z.number().positive().max(20_000).nullable(),
});

/** A robot with its tool, as it stands. */
const standing = {
  armId: z.uuid(),
  tool: z.object({
    xMm: millimetres,
    yMm: millimetres,
    zMm: millimetres,
    rollDeg: degrees,
    pitchDeg: degrees,
    yawDeg: degrees,
  }),
  wrist: z.enum(['held', 'free']),
  robot: z.object({ ...placement, riserMm }),
};

/** A robot and the work that falls to it. */
const work = {
  ...standing,
  points: z
    .array(workPointSchema)
    .min(1, 'The robot has no task point. Put one on a fixture first.')
    .max(500, 'A study takes at most 500 task points.'),
};

const gridSchema = z.object({
  /** The first place, mm; columns follow along x, rows along y. */
  originMm: pointMm,
  stepMm: z.number().min(5, 'A step is 5 mm or more.').max(1000, 'A step is at most 1000 mm.'),
  columns: z.number().int().min(1).max(2000),
  rows: z.number().int().min(1).max(2000),
});

export const standingQuestionSchema = z
  .object({
    study: z.literal('standing'),
    /** What is moved: the robot's base, or one fixture with all its points while the robot stays. */
    mover: z.enum(['robot', 'fixture']),
    ...work,
    /** Where the mover stands as drawn; with it the answer says what is gained. */
    drawn: z.object(placement),
    /** Floor that the mover takes, in its own frame; null: none. */
    footprintMm: outline.nullable(),
    /** Floor that is taken: zones without bases, obstacles, other fixtures. */
    blocksMm: z.array(outline).max(300, 'At most 300 outlines.'),
    grid: gridSchema,
    turnsDeg: z.array(degrees).min(1).max(72, 'At most 72 turns.'),
    /** Heights of the riser that are tried; a study of a fixture leaves the robot's own. */
    risersMm: z.array(riserMm).min(1).max(20, 'At most 20 riser heights.'),
  })
  .refine(({ mover, risersMm }) => mover === 'robot' || risersMm.length === 1, {
    path: ['risersMm'],
    message: 'A fixture is moved under one riser height of the robot.',
  });

export const toleranceQuestionSchema = z.object({
  study: z.literal('tolerance'),
  ...work,
  /** Errors of the base, each evenly spread between minus and plus this: place in x, y and z, turn, and level about x and y. */
  placeMm: z.number().min(0, 'An error is 0 or more.').max(1000),
  turnDeg: z.number().min(0, 'An error is 0 or more.').max(45),
  levelDeg: z.number().min(0, 'An error is 0 or more.').max(45),
  trials: z.number().int().min(10, 'At least 10 trials.').max(20_000, 'At most 20,000 trials.'),
  /** The same number gives the same trials. */
  seed: z
    .number()
    .int()
    .min(0)
    .max(2 ** 31),
});

/** How far the tool may be off at every spot of the floor where every joint is off by a stated error. */
export const errorGainQuestionSchema = z.object({
  study: z.literal('errorGain'),
  ...standing,
  /** Over the floor. */
  toolHeightMm: millimetres,
  /** As with maps: 0 straight down; a tilted tool points away from the base or along one heading of the floor. */
  tiltDeg: z.number().min(0).max(180),
  towards: z.enum(['outward', 'heading']),
  headingDeg: degrees,
  rollDeg: z.union([degrees, z.literal('free')]),
  /** Error of every turning joint, ± degrees, and of every sliding one, ± mm. */
  turnErrorDeg: z.number().min(0, 'An error is 0 or more.').max(10),
  slideErrorMm: z.number().min(0, 'An error is 0 or more.').max(100),
  grid: gridSchema,
});

export const studyQuestionSchema = z.discriminatedUnion('study', [
  standingQuestionSchema,
  toleranceQuestionSchema,
  errorGainQuestionSchema,
]);

export type WorkPoint = z.infer<typeof workPointSchema>;
export type StandingQuestion = z.infer<typeof standingQuestionSchema>;
export type ToleranceQuestion = z.infer<typeof toleranceQuestionSchema>;
export type ErrorGainQuestion = z.infer<typeof errorGainQuestionSchema>;
export type StudyQuestion = z.infer<typeof studyQuestionSchema>;
