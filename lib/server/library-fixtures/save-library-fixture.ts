import type { LibraryFixture as Answer, NewLibraryFixture } from '@/lib/contracts/library-fixtures';
import { LibraryFixture } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import type { Transaction } from '../database';
import { conflict } from '../errors';
import { demandRole } from '../policy';
import type { MemberActor } from '../policy';
import { demandFreeName } from './data';
import { presentLibraryFixture } from './present';

/** The whole library is sent to every sheet that opens. */
const MOST_FIXTURES = 300;

/** Keeps a fixture with its task points. Throws 422 for a taken name, 409 `library_full`. */
export async function saveLibraryFixture(
  actor: MemberActor,
  { name, content }: NewLibraryFixture,
  outer?: Transaction,
): Promise<Answer> {
  demandRole(actor, 'planner');
  const { organisationId, userId } = actor;
  return inTransaction(async (transaction) => {
    await demandFreeName(organisationId, name, null, transaction);
    const count = await LibraryFixture.count({ where: { organisationId }, transaction });
    if (count >= MOST_FIXTURES) {
      throw conflict(
        'library_full',
        `The library holds ${MOST_FIXTURES} fixtures. Delete one that is not used any more.`,
      );
    }
    const fixture = await LibraryFixture.create(
      { organisationId, name, content: onItsOwn(content), createdBy: userId },
      { transaction },
    );
    await recordAudit(actor, { action: 'fixture.saved', subjectId: fixture.id, details: { name } }, transaction);
    return presentLibraryFixture(fixture);
  }, outer);
}

/** Which robot did the work is a matter of the sheet that it came from. */
function onItsOwn(content: NewLibraryFixture['content']): NewLibraryFixture['content'] {
  const free = <T extends { robotId: string | null }>(entry: T): T => ({ ...entry, robotId: null });
  return {
    ...content,
    taskPoints: content.taskPoints.map(free),
    taskPaths: content.taskPaths.map(free),
    taskPatterns: content.taskPatterns.map(free),
  };
}
