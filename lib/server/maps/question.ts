import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { z } from 'zod';
import { armSchema } from '@/lib/contracts/arm';
import { mapRequestSchema } from '@/lib/contracts/analyse';
import type { MapQuestion } from '@/lib/contracts/maps';
import { canonicalJson } from '@/lib/kinematics/canonical-json';
import { KERNEL_VERSION } from '@/lib/kinematics/version';
import { finestStepMm, mapRequestOf, type KernelQuestion } from '@/lib/layout/map-question';
import { Arm } from '@/models';
import { invalid, notFound } from '../errors';
import type { MemberActor } from '../policy';
import { spotLimitOf } from './tiling';

/** All that the answer depends on, as it is stored with the map and read back by the worker. */
export interface MapInput extends KernelQuestion {
  readonly kernelVersion: number;
}

export const mapInputSchema = z.object({
  kernelVersion: z.number().int(),
  arm: armSchema,
  request: mapRequestSchema,
}) satisfies z.ZodType<MapInput, unknown>;

/** SHA-256 of the canonical JSON of the whole input, hexadecimal. */
export function mapKey(input: MapInput): string {
  return createHash('sha256').update(canonicalJson(input)).digest('hex');
}

/**
 * What the kernel has to be asked.
 * @throws 404 for an arm of somebody else.
 */
export async function mapInputOf(
  actor: MemberActor,
  question: MapQuestion,
  transaction?: Transaction,
): Promise<MapInput> {
  const arm = await Arm.findOne({
    where: { id: question.armId, organisationId: actor.organisationId },
    transaction,
  });
  if (!arm) throw notFound('arm');
  return { kernelVersion: KERNEL_VERSION, ...mapRequestOf(question, arm.definition) };
}

/** @throws 422 for a map of too many spots, naming the step that would do. */
export function demandAffordable(input: MapInput): void {
  const { columns, rows } = input.request.grid;
  const limit = spotLimitOf(input);
  if (columns * rows <= limit) return;
  const number = new Intl.NumberFormat('en-GB');
  throw invalid(
    'settings.stepMm',
    `This map would have ${number.format(columns * rows)} spots; ${number.format(limit)} is the most for this arm and tool. ` +
      `Choose a step of ${finestStepMm(input.arm, limit)} mm or more.`,
  );
}
