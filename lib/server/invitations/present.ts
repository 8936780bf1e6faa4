import type { Invitation as InvitationAnswer } from '@/lib/contracts/accounts';
import type { Invitation } from '@/models';

export function presentInvitation(invitation: Invitation): InvitationAnswer {
  return {
    id: invitation.id,
    email: invitation.email,
    role: invitation.role,
    projectIds: invitation.projectIds,
    expiresAt: invitation.expiresAt.toISOString(),
    acceptedAt: invitation.acceptedAt?.toISOString() ?? null,
  };
}
