import { z } from 'zod';
import { armSchema } from './arm';
import { idSchema, timestampSchema } from './common';

/** One frozen version of an arm in an organisation's library. GET /api/arms, GET /api/arms/[armId] */
export const libraryArmSchema = z.object({
  id: idSchema,
  /** Shared by all versions of one arm. */
  familyId: idSchema,
  version: z.number().int().min(1),
  name: z.string(),
  description: z.string(),
  payloadKg: z.number().nullable(),
  /** From the first axis to the wrist centre, or to the tool point of an arm without one: see lib/layout/arm-reach. */
  reachMm: z.number(),
  definition: armSchema,
  createdAt: timestampSchema,
  /** False once a newer version exists. */
  latest: z.boolean(),
  layoutCount: z.number().int(),
  /** Put away: no longer offered for placing, but layouts that use it keep it. Shared by all versions. */
  archivedAt: timestampSchema.nullable(),
});
export type LibraryArm = z.infer<typeof libraryArmSchema>;
export const libraryArmListSchema = z.object({ arms: z.array(libraryArmSchema) });

/** GET /api/arms?archived=true|false */
export const armListQuerySchema = z.object({ archived: z.enum(['true', 'false']).default('false') });
export type ArmListQuery = z.infer<typeof armListQuerySchema>;

const armName = z.string().trim().min(1, 'Give the arm a name.').max(120, 'An arm name has at most 120 characters.');

/** What one version says. The name belongs to the version too: revisions show it as it was. */
export const armContentSchema = z.object({
  name: armName,
  description: z.string().trim().max(2000, 'At most 2000 characters.').default(''),
  payloadKg: z
    .number('Write the payload in kg, or leave it empty.')
    .min(0, 'A payload cannot be below zero.')
    .max(100_000, 'A payload has at most 100 000 kg.')
    .nullable()
    .default(null),
  definition: armSchema,
});
export type ArmContent = z.infer<typeof armContentSchema>;

const armCopySchema = z.strictObject({ copyOf: idSchema, name: armName });

/**
 * POST /api/arms: a new arm from its data, or as a copy of any version of another one. No plain union: what it refuses would carry no
 * name of a field.
 */
export const newArmSchema = z.unknown().transform((value, context) => {
  const isCopy = typeof value === 'object' && value !== null && 'copyOf' in value;
  const parsed = isCopy ? armCopySchema.safeParse(value) : armContentSchema.safeParse(value);
  if (parsed.success) return parsed.data;
  for (const { path, message } of parsed.error.issues)
    context.addIssue({ code: 'custom', path, message, input: value });
  return z.NEVER;
});
export type NewArm = z.output<typeof newArmSchema>;

/** POST /api/arms/[armId]/versions. `baseVersion`: the version that was edited; 409 `stale_arm` with `newest` if there is a newer one. */
export const newArmVersionSchema = armContentSchema.extend({ baseVersion: z.number().int().min(1) });
export type NewArmVersion = z.infer<typeof newArmVersionSchema>;

/** PATCH /api/arms/[armId]: concerns all versions of the arm. */
export const armChangeSchema = z.object({ archived: z.boolean() });
export type ArmChange = z.infer<typeof armChangeSchema>;
