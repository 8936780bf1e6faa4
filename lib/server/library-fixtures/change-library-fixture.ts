import type { LibraryFixture as Answer, LibraryFixtureChange } from '@/lib/contracts/library-fixtures';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import type { Transaction } from '../database';
import type { Actor } from '../policy';
import { demandFreeName, findLibraryFixture } from './data';
import { presentLibraryFixture } from './present';

/** Renames a fixture of the library; copies on sheets keep their names. Throws 404, 422 for a taken name. */
export async function renameLibraryFixture(
  actor: Actor,
  fixtureId: string,
  { name }: LibraryFixtureChange,
  outer?: Transaction,
): Promise<Answer> {
  return inTransaction(async (transaction) => {
    const fixture = await findLibraryFixture(actor, fixtureId, transaction);
    await demandFreeName(actor.organisationId, name, fixtureId, transaction);
    const before = fixture.name;
    await fixture.update({ name }, { transaction });
    const details = { name, before };
    await recordAudit(actor, { action: 'fixture.renamed', subjectId: fixtureId, details }, transaction);
    return presentLibraryFixture(fixture);
  }, outer);
}

/** Takes a fixture out of the library; copies on sheets stay. Throws 404. */
export async function deleteLibraryFixture(actor: Actor, fixtureId: string, outer?: Transaction): Promise<void> {
  await inTransaction(async (transaction) => {
    const fixture = await findLibraryFixture(actor, fixtureId, transaction);
    await fixture.destroy({ transaction });
    const details = { name: fixture.name };
    await recordAudit(actor, { action: 'fixture.deleted', subjectId: fixtureId, details }, transaction);
  }, outer);
}
