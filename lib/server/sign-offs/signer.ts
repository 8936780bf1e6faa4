import type { Guest } from '@/lib/contracts/remarks';
import { forbidden } from '../errors';
import type { MemberActor, ShareActor } from '../policy';

/** Somebody who signs: a viewer with an account, or a guest of a share link who said who they are. */
export type Signer = { actor: MemberActor } | { actor: ShareActor; guest: Guest };

/** Throws 403 for those whose revision it is: a drawing is not accepted by those who drew it; and for links that may not sign. */
export function demandMaySign({ actor }: Signer): void {
  if (actor.kind === 'share' ? actor.maySign : actor.role === 'viewer') return;
  if (actor.kind === 'share') {
    throw forbidden('This link is not made for signing. Ask the person who sent it for one that is.');
  }
  throw forbidden('Accepting a revision is the customer’s part. Share it with them by a link that may sign.');
}

export function signerPerson(signer: Signer): Guest {
  if ('guest' in signer) return signer.guest;
  return { name: signer.actor.name, email: signer.actor.email };
}

/** The columns that say who signed. */
export function signerColumns(signer: Signer) {
  const { name, email } = signerPerson(signer);
  const by = 'guest' in signer ? { shareLinkId: signer.actor.shareLinkId } : { userId: signer.actor.userId };
  return { signerName: name, signerEmail: email, ...by };
}
