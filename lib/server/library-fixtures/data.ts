import { col, fn, Op, where } from 'sequelize';
import type { LibraryFixture as Answer } from '@/lib/contracts/library-fixtures';
import { LibraryFixture } from '@/models';
import type { Transaction } from '../database';
import { invalid, notFound } from '../errors';
import { demandRole } from '../policy';
import type { Actor } from '../policy';
import { presentLibraryFixture } from './present';

/** Every fixture that the organisation keeps, by name. */
export async function listLibraryFixtures(actor: Actor, transaction?: Transaction): Promise<Answer[]> {
  demandRole(actor, 'planner');
  const { organisationId } = actor;
  const fixtures = await LibraryFixture.findAll({ where: { organisationId }, order: [['name', 'ASC']], transaction });
  return fixtures.map(presentLibraryFixture);
}

/** Throws 404 for a fixture of another organisation. */
export async function findLibraryFixture(
  actor: Actor,
  fixtureId: string,
  transaction: Transaction,
): Promise<LibraryFixture> {
  demandRole(actor, 'planner');
  const { organisationId } = actor;
  const fixture = await LibraryFixture.findOne({ where: { id: fixtureId, organisationId }, transaction });
  if (!fixture) throw notFound('fixture');
  return fixture;
}

/** Throws 422 where another fixture of the organisation bears the name, in small letters or large. */
export async function demandFreeName(
  organisationId: string,
  name: string,
  exceptId: string | null,
  transaction: Transaction,
): Promise<void> {
  const taken = await LibraryFixture.findOne({
    where: {
      organisationId,
      [Op.and]: [where(fn('lower', col('name')), name.toLowerCase())],
      ...(exceptId && { id: { [Op.ne]: exceptId } }),
    },
    transaction,
  });
  if (taken) throw invalid('name', `The library has a fixture “${taken.name}” already. Choose another name.`);
}
