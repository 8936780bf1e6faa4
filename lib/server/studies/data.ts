import type { Transaction } from 'sequelize';
import { Study } from '@/models';
import { notFound } from '../errors';
import { demandRole, type Actor } from '../policy';

/**
 * A study of the planner's own organisation. Viewers and share links see none: a study speaks of drafts.
 * @throws 404 otherwise.
 */
export async function findStudy(actor: Actor, studyId: string, transaction?: Transaction): Promise<Study> {
  demandRole(actor, 'planner');
  const study = await Study.findOne({ where: { id: studyId, organisationId: actor.organisationId }, transaction });
  if (!study) throw notFound('study');
  return study;
}

/** The same study, held against every other change until the transaction ends. */
export async function lockStudy(actor: Actor, studyId: string, transaction: Transaction): Promise<Study> {
  demandRole(actor, 'planner');
  const study = await Study.findOne({
    where: { id: studyId, organisationId: actor.organisationId },
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  if (!study) throw notFound('study');
  return study;
}

/** Ended without an answer. */
export const isOver = ({ state }: Study): boolean => state === 'failed' || state === 'cancelled';
