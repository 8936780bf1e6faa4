import type { Transaction } from 'sequelize';
import { SignOff } from '@/models';

/** The sign-offs of a revision that the caller has already been let at, oldest first. */
export async function signOffsOf(revisionId: string, transaction?: Transaction): Promise<SignOff[]> {
  return SignOff.findAll({
    where: { revisionId },
    order: [
      ['createdAt', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction,
  });
}
