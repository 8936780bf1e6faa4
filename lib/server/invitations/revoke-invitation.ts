import { Invitation } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { notFound } from '../errors';
import { demandRole } from '../policy';
import type { Actor } from '../policy';

/** Its link is dead at once. Throws 404 for one that is foreign, accepted or withdrawn already. */
export async function revokeInvitation(actor: Actor, invitationId: string): Promise<void> {
  demandRole(actor, 'admin');
  await inTransaction(async (transaction) => {
    const where = { id: invitationId, organisationId: actor.organisationId, acceptedAt: null, revokedAt: null };
    const [revoked] = await Invitation.update({ revokedAt: new Date() }, { where, transaction });
    if (revoked === 0) throw notFound('invitation');
    await recordAudit(actor, { action: 'invitation.revoked', subjectId: invitationId }, transaction);
  });
}
