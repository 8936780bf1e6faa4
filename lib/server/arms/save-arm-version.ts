import type { LibraryArm, NewArmVersion } from '@/lib/contracts/arms';
import { canonicalJson } from '@/lib/kinematics/canonical-json';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import type { Transaction } from '../database';
import { conflict } from '../errors';
import { demandRole } from '../policy';
import type { Actor } from '../policy';
import { addVersion, contentOf } from './create-arm';
import { holdNewest } from './data';

/**
 * Saves an edited arm as its next version; the one before stays for the layouts, maps and revisions that name it. Throws 409
 * `stale_arm` with the newer version if somebody saved in between, and `archived_arm`. A repeat of a request that was already
 * done (its answer was lost) gives the version that it made.
 */
export async function saveArmVersion(
  actor: Actor,
  armId: string,
  { baseVersion, ...content }: NewArmVersion,
  outer?: Transaction,
): Promise<LibraryArm> {
  demandRole(actor, 'integrator');
  return inTransaction(async (transaction) => {
    const newest = await holdNewest(actor, armId, transaction);
    if (newest.archivedAt) throw conflict('archived_arm', 'This arm is archived. Bring it back before you change it.');
    if (newest.version !== baseVersion) {
      if (newest.version === baseVersion + 1 && isSame(contentOf(newest), content)) return newest;
      throw conflict(
        'stale_arm',
        `Somebody saved version ${newest.version} while you edited version ${baseVersion}. Look at what changed, then save yours on top of it or let it go.`,
        { newest },
      );
    }
    const row = { ...content, familyId: newest.familyId, version: newest.version + 1 };
    const arm = await addVersion(actor, row, transaction);
    const details = { name: arm.name, version: arm.version };
    await recordAudit(actor, { action: 'arm.version_saved', subjectId: arm.id, details }, transaction);
    return arm;
  }, outer);
}

/** By way of JSON text, as the database keeps it: a field left out and one that is undefined come to the same. */
const isSame = (one: object, other: object): boolean => plain(one) === plain(other);
const plain = (value: object): string => canonicalJson(JSON.parse(JSON.stringify(value)));
