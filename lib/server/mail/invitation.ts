import { Op } from 'sequelize';
import type { Role } from '@/lib/contracts/common';
import { Invitation, Organisation, User } from '@/models';
import { env } from '../env';
import { derivedToken } from '../tokens';
import type { Message } from './message';

const MAY: Record<Role, string> = {
  viewer: 'You can look at what is shared with you and write remarks.',
  planner: 'You can draw layouts and see what every arm can do on them.',
  integrator: 'You can draw layouts, keep the arm library, and issue and share revisions.',
  admin: 'You can do everything in the organisation, members and roles included.',
};

export async function composeInvitation({ invitationId }: { invitationId: string }): Promise<Message | null> {
  const invitation = await Invitation.findOne({
    where: { id: invitationId, acceptedAt: null, revokedAt: null, expiresAt: { [Op.gt]: new Date() } },
    include: [
      { model: Organisation, as: 'organisation', required: true },
      { model: User, as: 'inviter' },
    ],
  });
  if (!invitation?.organisation) return null;
  const organisation = invitation.organisation.name;
  const inviter = invitation.inviter?.name ?? organisation;
  const until = invitation.expiresAt.toISOString().slice(0, 10);
  return {
    subject: `${inviter} invites you to ${organisation} on Elbowroom`,
    paragraphs: [
      `${inviter} invites you to join ${organisation} on Elbowroom, where robot cells are laid out and argued over.`,
      MAY[invitation.role],
      `Choose your password with the link below. It works once, until ${until}.`,
    ],
    action: {
      label: 'Accept the invitation',
      url: `${env.APP_URL}/invitation/${derivedToken('invitation', invitation.id)}`,
    },
    reason: 'If you did not expect this, do nothing: without the link no account is made.',
  };
}
