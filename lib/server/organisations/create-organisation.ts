import { Organisation } from '@/models';
import { inTransaction } from '../database';
import type { Transaction } from '../database';
import { plantBuiltInArms } from './plant-built-in-arms';

/** A new organisation with an arm library to start from; it has no members yet. */
export function createOrganisation(name: string, outer?: Transaction): Promise<Organisation> {
  return inTransaction(async (transaction) => {
    const organisation = await Organisation.create({ name }, { transaction });
    await plantBuiltInArms(organisation.id, transaction);
    return organisation;
  }, outer);
}
