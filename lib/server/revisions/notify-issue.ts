import type { Transaction } from 'sequelize';
import { sendMailLater } from '../mail';
import type { MemberActor } from '../policy';
import { concernedBy } from './concerned';
import type { PlacedRevision } from './data';

/** Tells everyone concerned but the issuer that there is a revision to review. */
export async function notifyOfIssue(
  actor: MemberActor,
  revision: PlacedRevision,
  transaction: Transaction,
): Promise<void> {
  const { snapshot, number, note, layout } = revision;
  for (const { email, path } of await concernedBy(revision, transaction)) {
    if (email === actor.email) continue;
    const data = {
      projectName: layout.project.name,
      layoutTitle: `${snapshot.letter} · ${snapshot.name}`,
      revisionNumber: number,
      issuerName: actor.name,
      note,
      path,
    };
    await sendMailLater({ to: email, template: 'issue', data }, transaction);
  }
}
