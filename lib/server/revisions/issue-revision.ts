import type { Transaction } from 'sequelize';
import { Revision } from '@/models';
import type { Revision as RevisionAnswer } from '@/lib/contracts/revisions';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict } from '../errors';
import { findLayout } from '../layouts/data';
import type { MemberActor } from '../policy';
import { findRevision } from './data';
import { notifyOfIssue } from './notify-issue';
import { presentRevision } from './present';
import { snapshotHash, takeSnapshot } from './snapshot';

/** Freezes the layout under the next number; what was in review before is superseded. Throws 409 `nothing_to_issue`. */
export async function issueRevision(
  actor: MemberActor,
  layoutId: string,
  { note }: { note: string },
  outer?: Transaction,
): Promise<RevisionAnswer> {
  return inTransaction(async (transaction) => {
    const layout = await findLayout(actor, layoutId, transaction, { lock: true });
    const snapshot = await takeSnapshot(actor, layout, transaction);
    if (snapshot.items.length === 0) {
      throw conflict('nothing_to_issue', 'This sheet is still empty. Place something on the floor, then issue it.');
    }
    const last = (await Revision.max<number | null, Revision>('number', { where: { layoutId }, transaction })) ?? 0;
    await Revision.update(
      { state: 'superseded' },
      { where: { layoutId, state: ['issued', 'changes_requested'] }, transaction },
    );
    const { id } = await Revision.create(
      { layoutId, number: last + 1, note, snapshot, sha256: snapshotHash(snapshot), issuedBy: actor.userId },
      { transaction },
    );
    await recordAudit(actor, { action: 'revision.issued', subjectId: id, details: { number: last + 1 } }, transaction);
    const revision = await findRevision(actor, id, transaction);
    await notifyOfIssue(actor, revision, transaction);
    return presentRevision(actor, revision);
  }, outer);
}
