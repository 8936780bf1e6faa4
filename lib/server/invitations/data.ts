import { Op } from 'sequelize';
import type { z } from 'zod';
import type { invitationPreviewSchema, Invitation as InvitationAnswer } from '@/lib/contracts/accounts';
import { Invitation, Organisation } from '@/models';
import type { Transaction } from '../database';
import { linkNotValid } from '../errors';
import { demandRole } from '../policy';
import type { Actor } from '../policy';
import { hashToken } from '../tokens';
import { presentInvitation } from './present';

/** Those not accepted and not withdrawn, newest first; expired ones too, since they can be sent again. */
export async function listInvitations(actor: Actor): Promise<InvitationAnswer[]> {
  demandRole(actor, 'admin');
  const invitations = await Invitation.findAll({
    where: { organisationId: actor.organisationId, acceptedAt: null, revokedAt: null },
    order: [['createdAt', 'DESC']],
  });
  return invitations.map(presentInvitation);
}

/** The invitation that a link opens. Throws 404 `link_not_valid` for a wrong, expired, accepted or withdrawn one. */
export async function openInvitation(token: string, transaction?: Transaction): Promise<Invitation> {
  const invitation = await Invitation.findOne({
    where: {
      tokenHash: hashToken(token),
      acceptedAt: null,
      revokedAt: null,
      expiresAt: { [Op.gt]: new Date() },
    },
    include: { model: Organisation, as: 'organisation', required: true },
    ...(transaction && { lock: { level: transaction.LOCK.UPDATE, of: Invitation }, transaction }),
  });
  if (!invitation) throw linkNotValid();
  return invitation;
}

export async function previewInvitation(token: string): Promise<z.output<typeof invitationPreviewSchema>> {
  const { email, role, organisation } = await openInvitation(token);
  return { email, role, organisationName: organisation?.name ?? '' };
}
