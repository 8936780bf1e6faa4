import { Op, type Transaction } from 'sequelize';
import type { SignOffRequest, SignOffState } from '@/lib/contracts/sign-offs';
import { Revision, SignOff } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict } from '../errors';
import { findRevision, type PlacedRevision } from '../revisions/data';
import { snapshotHash } from '../revisions/snapshot';
import { notifyOfSignOff } from './notify';
import { readSignOffs } from './read-sign-offs';
import { demandMaySign, signerColumns, type Signer } from './signer';

/** Throws 409 where the signer would sign something else than what they saw, or what a newer revision has replaced. */
function demandSignable({ state, snapshot, sha256 }: PlacedRevision, seen: string): void {
  if (state === 'superseded') {
    throw conflict('superseded', 'A newer revision has been issued meanwhile. Open that one and sign it.');
  }
  // Worked out anew, so that nobody signs what has been tampered with in the store.
  if (seen !== sha256 || snapshotHash(snapshot) !== sha256) {
    const detail = 'What is stored is not what was on your screen. Nothing was signed; load the page again.';
    throw conflict('other_content', detail);
  }
}

/** One accepted revision a layout: an older one has been replaced by it. */
async function supersedeAccepted({ id, layoutId, number }: PlacedRevision, transaction: Transaction): Promise<void> {
  await Revision.update(
    { state: 'superseded' },
    { where: { layoutId, id: { [Op.ne]: id }, number: { [Op.lt]: number }, state: 'accepted' }, transaction },
  );
}

/**
 * Writes down that somebody accepts a revision or asks for changes. The last word counts for the revision's state; every word stays.
 * Throws 403 for those who may not sign, 409 `superseded` and `other_content`.
 */
export async function signRevision(
  signer: Signer,
  revisionId: string,
  { decision, note, sha256 }: SignOffRequest,
  outer?: Transaction,
): Promise<SignOffState> {
  demandMaySign(signer);
  return inTransaction(async (transaction) => {
    await findRevision(signer.actor, revisionId, transaction);
    // Held until the signature is there: issuing a newer one waits, or has been before.
    await Revision.findByPk(revisionId, { attributes: ['id'], lock: transaction.LOCK.UPDATE, transaction });
    const revision = await findRevision(signer.actor, revisionId, transaction);
    demandSignable(revision, sha256);
    const signOff = await SignOff.create(
      { revisionId, sha256, decision, note, ...signerColumns(signer) },
      { transaction },
    );
    await Revision.update({ state: decision }, { where: { id: revisionId }, transaction });
    if (decision === 'accepted') await supersedeAccepted(revision, transaction);
    await recordAudit(
      signer.actor,
      { action: `revision.${decision}`, subjectId: revisionId, details: { number: revision.number, sha256 } },
      transaction,
    );
    await notifyOfSignOff(signer, revision, signOff, transaction);
    return readSignOffs(signer.actor, revisionId, transaction);
  }, outer);
}
