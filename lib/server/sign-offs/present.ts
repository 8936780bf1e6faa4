import type { SignOff as SignOffAnswer } from '@/lib/contracts/sign-offs';
import type { SignOff } from '@/models';
import { actsAs, type Actor } from '../policy';

/** Addresses are for the integrator's side, and for the signer's own account. */
export function presentSignOff(signOff: SignOff, actor: Actor): SignOffAnswer {
  const own = actor.kind === 'member' && signOff.userId === actor.userId;
  return {
    id: signOff.id,
    decision: signOff.decision,
    note: signOff.note,
    sha256: signOff.sha256,
    name: signOff.signerName,
    email: own || actsAs(actor, 'planner') ? signOff.signerEmail : null,
    signedAt: signOff.createdAt.toISOString(),
  };
}
