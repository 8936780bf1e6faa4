import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import type { Invitation as InvitationAnswer, invitationRequestSchema } from '@/lib/contracts/accounts';
import { Invitation, Membership, User } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { conflict, invalid } from '../errors';
import { sendMailLater } from '../mail';
import { demandProjects } from '../members/data';
import { demandRole } from '../policy';
import type { Actor } from '../policy';
import { derivedToken, hashToken } from '../tokens';
import { presentInvitation } from './present';

const VALID_DAYS = 14;

/**
 * Invites somebody by e-mail; an earlier open invitation of the same address is withdrawn.
 * Throws 409 `already_member`, 422 for projects that do not fit the role.
 */
export async function createInvitation(
  actor: Actor,
  request: z.output<typeof invitationRequestSchema>,
): Promise<InvitationAnswer> {
  demandRole(actor, 'admin');
  const { organisationId } = actor;
  const { email, role, projectIds } = request;
  if (role !== 'viewer' && projectIds.length > 0)
    throw invalid('projectIds', 'Only a viewer is limited to projects; every other role sees all of them.');

  return inTransaction(async (transaction) => {
    await demandProjects(organisationId, projectIds, transaction);
    // Members of this organisation only: who belongs to another one is not for its neighbours to learn.
    const member = await Membership.findOne({
      where: { organisationId },
      include: { model: User, as: 'user', required: true, where: { email } },
      transaction,
    });
    if (member)
      throw conflict('already_member', `${email} is a member already. Change the role in the list of members.`);

    const open = { organisationId, email, acceptedAt: null, revokedAt: null };
    await Invitation.update({ revokedAt: new Date() }, { where: open, transaction });
    const id = randomUUID();
    const invitation = await Invitation.create(
      {
        id,
        organisationId,
        email,
        role,
        projectIds: [...new Set(projectIds)],
        tokenHash: hashToken(derivedToken('invitation', id)),
        invitedBy: actor.userId,
        expiresAt: new Date(Date.now() + VALID_DAYS * 24 * 3600 * 1000),
      },
      { transaction },
    );
    await sendMailLater({ to: email, template: 'invitation', data: { invitationId: id } }, transaction);
    await recordAudit(actor, { action: 'invitation.sent', subjectId: id, details: { email, role } }, transaction);
    return presentInvitation(invitation);
  });
}
