import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { z } from 'zod';
import { armSchema } from '@/lib/contracts/arm';
import { studyQuestionSchema, type StudyQuestion } from '@/lib/contracts/studies';
import { canonicalJson } from '@/lib/kinematics/canonical-json';
import { KERNEL_VERSION } from '@/lib/kinematics/version';
import { Arm } from '@/models';
import { invalid, notFound } from '../errors';
import type { MemberActor } from '../policy';
import { WORK_LIMIT, workOf, type StudyInput } from './slicing';

/** Raised when the same question would get another answer although the kernel is the same. */
export const STUDY_VERSION = 1;

/** All that the answer depends on, as it is stored with the study and read back by the worker. */
export const storedInputSchema = z.object({
  kernelVersion: z.number().int(),
  studyVersion: z.number().int(),
  arm: armSchema,
  question: studyQuestionSchema,
});
export interface StoredInput extends StudyInput {
  readonly kernelVersion: number;
  readonly studyVersion: number;
}

export const isOfThisVersion = ({ kernelVersion, studyVersion }: StoredInput): boolean =>
  kernelVersion === KERNEL_VERSION && studyVersion === STUDY_VERSION;

/** SHA-256 of the canonical JSON of the whole input, hexadecimal. Arms count by what they are, not by their id. */
export function studyKey(input: StoredInput): string {
  const { armId: _, ...asked } = input.question;
  return createHash('sha256')
    .update(canonicalJson({ ...input, question: asked }))
    .digest('hex');
}

/** @throws 404 for an arm of somebody else. */
export async function storedInputOf(
  actor: MemberActor,
  question: StudyQuestion,
  transaction?: Transaction,
): Promise<StoredInput> {
  const arm = await Arm.findOne({ where: { id: question.armId, organisationId: actor.organisationId }, transaction });
  if (!arm) throw notFound('arm');
  return { kernelVersion: KERNEL_VERSION, studyVersion: STUDY_VERSION, arm: arm.definition, question };
}

/** @throws 422 for a study of too much work, saying what to do. */
export function demandAffordable(input: StoredInput): void {
  const work = workOf(input);
  if (work <= WORK_LIMIT) return;
  const times = Math.ceil(work / WORK_LIMIT);
  if (input.question.study === 'tolerance') {
    throw invalid('trials', `These trials would take ${times} times as long as one study may. Ask for fewer trials.`);
  }
  throw invalid(
    'grid.stepMm',
    `This study would take ${times} times as long as one may. Choose a coarser step, fewer turns or fewer riser heights.`,
  );
}
