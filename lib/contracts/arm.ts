import { z } from 'zod';
import type { Arm } from '@/lib/kinematics/types';

/**
 * An arm as it crosses the edge: SI units (m, rad, s). One schema serves the form, the import, the API and `analyse`,
 * so a bad arm is refused with the same words everywhere.
 */

const MAX_JOINTS = 12;
/** No link, offset or stroke of a plantroom arm is longer; it also keeps squares far from overflow. */
const MAX_LENGTH_M = 100;
const MAX_ANGLE_RAD = 100 * Math.PI;

/** At least and at most, with the same words for both. */
const within = (most: number, missing: string, words: string) => z.number(missing).min(-most, words).max(most, words);

const length = within(MAX_LENGTH_M, 'Write a number (m).', `Lengths go up to ${MAX_LENGTH_M} m.`);
const angle = within(MAX_ANGLE_RAD, 'Write a number (rad).', 'Angles go up to 50 full turns.');
const limit = within(1000, 'Write a number.', 'Limits go up to 1000 rad or 1000 m.');
const speed = z
  .number('Write a speed.')
  .positive('A joint needs a speed above zero.')
  .max(1000, 'Speeds go up to 1000 rad/s or 1000 m/s.');
const acceleration = z
  .number('Write an acceleration.')
  .positive('A joint needs an acceleration above zero.')
  .max(100_000, 'Accelerations go up to 100 000 rad/s² or m/s².');

const vec3 = z.tuple([length, length, length]);
const frameSchema = z.object({ xyz: vec3, rpy: z.tuple([angle, angle, angle]) });

const travel = { min: limit, max: limit, maxSpeed: speed, maxAcceleration: acceleration };

export const jointSchema = z.object({
  type: z.enum(['revolute', 'prismatic']),
  a: length,
  alpha: angle,
  d: length,
  theta: angle,
  ...travel,
});
export const actuatorSchema = z.object(travel);

const asDegrees = (rad: number) => `${Number(((rad * 180) / Math.PI).toFixed(3))}°`;
const asMillimetres = (m: number) => `${Number((m * 1000).toFixed(3))} mm`;

/** "Joint 3 starts at 95° and ends at 75°. The start must be below the end." */
function swappedLimits(label: string, min: number, max: number, turns: boolean): string {
  const show = turns ? asDegrees : asMillimetres;
  return `${label} starts at ${show(min)} and ends at ${show(max)}. The start must be below the end.`;
}

export const armSchema = z
  .object({
    convention: z.enum(['standard', 'modified']),
    joints: z
      .array(jointSchema)
      .min(1, 'An arm needs at least one joint.')
      .max(MAX_JOINTS, `An arm has at most ${MAX_JOINTS} joints.`),
    base: frameSchema.optional(),
    tool: frameSchema.optional(),
    freedoms: z
      .array(z.enum(['x', 'y', 'z', 'rx', 'ry', 'rz']))
      .min(1, 'Name at least one freedom, or leave the field out.')
      .max(6)
      .optional(),
    coupling: z.array(z.array(within(1000, 'Write a number.', 'Shares go up to 1000.'))).optional(),
    actuators: z.array(actuatorSchema).min(1).max(MAX_JOINTS).optional(),
  })
  .superRefine((arm, context) => {
    const refuse = (path: (string | number)[], message: string) =>
      context.addIssue({ code: 'custom', path, message, input: arm });
    arm.joints.forEach((joint, index) => {
      if (joint.min >= joint.max)
        refuse(
          ['joints', index, 'min'],
          swappedLimits(`Joint ${index + 1}`, joint.min, joint.max, joint.type === 'revolute'),
        );
    });
    arm.actuators?.forEach((actuator, index) => {
      if (actuator.min >= actuator.max)
        refuse(['actuators', index, 'min'], swappedLimits(`Actuator ${index + 1}`, actuator.min, actuator.max, true));
    });
    if (arm.freedoms) {
      if (new Set(arm.freedoms).size !== arm.freedoms.length) refuse(['freedoms'], 'A freedom is named twice.');
      if (!arm.freedoms.some((freedom) => ['x', 'y', 'z'].includes(freedom)))
        refuse(['freedoms'], 'Name at least one of x, y and z: the tool point has to move.');
    }
    if (arm.coupling) checkCoupling(arm.coupling, arm.joints.length, arm.actuators?.length, refuse);
    else if (arm.actuators && arm.actuators.length !== arm.joints.length)
      refuse(['actuators'], 'Without a coupling there is one actuator a joint.');
  }) satisfies z.ZodType<Arm, unknown>;

function checkCoupling(
  coupling: number[][],
  joints: number,
  actuators: number | undefined,
  refuse: (path: (string | number)[], message: string) => void,
) {
  if (coupling.length !== joints) {
    refuse(['coupling'], `The coupling has ${coupling.length} rows; it needs one a joint (${joints}).`);
    return;
  }
  const columns = coupling[0]?.length ?? 0;
  if (columns === 0 || columns > MAX_JOINTS)
    refuse(['coupling', 0], 'A row of the coupling has one entry an actuator.');
  coupling.forEach((row, index) => {
    if (row.length !== columns)
      refuse(
        ['coupling', index],
        `Row ${index + 1} of the coupling has ${row.length} entries, the first has ${columns}.`,
      );
  });
  if (actuators === undefined && columns !== joints)
    refuse(['actuators'], 'A coupling that is not square needs the limits and speeds of its actuators.');
  if (actuators !== undefined && actuators !== columns)
    refuse(['actuators'], `There are ${actuators} actuators, but the coupling has ${columns} columns.`);
}

export type ArmDefinition = z.infer<typeof armSchema>;
