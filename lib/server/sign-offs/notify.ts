import type { Transaction } from 'sequelize';
import type { SignOff } from '@/models';
import { sendMailLater } from '../mail';
import { concernedBy } from '../revisions/concerned';
import type { PlacedRevision } from '../revisions/data';
import { signerPerson, type Signer } from './signer';

/** Tells everyone concerned, and gives the signer a receipt that names what they signed. */
export async function notifyOfSignOff(
  signer: Signer,
  revision: PlacedRevision,
  signOff: SignOff,
  transaction: Transaction,
): Promise<void> {
  const { email: own, name } = signerPerson(signer);
  const data = {
    projectName: revision.layout.project.name,
    layoutTitle: `${revision.snapshot.letter} · ${revision.snapshot.name}`,
    revisionNumber: revision.number,
    decision: signOff.decision,
    signerName: name,
    signedAt: signOff.createdAt.toISOString(),
    sha256: signOff.sha256,
    note: signOff.note,
  };
  const others = (await concernedBy(revision, transaction)).filter(({ email }) => email !== own);
  for (const { email, path } of others) {
    await sendMailLater({ to: email, template: 'sign-off', data: { ...data, path } }, transaction);
  }
  const path = signer.actor.kind === 'member' ? `/revisions/${revision.id}` : null;
  await sendMailLater({ to: own, template: 'sign-off-receipt', data: { ...data, path } }, transaction);
}
