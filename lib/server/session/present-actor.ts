import type { Membership } from '@/models';
import type { MemberActor } from '../policy';

/** A membership read with its user and, for viewers, its projects. */
export function presentActor(membership: Membership): MemberActor {
  const { id, userId, organisationId, role, user, projectViewers } = membership;
  if (!user) throw new Error('A membership was read without its user');
  const projectIds = role === 'viewer' ? (projectViewers ?? []).map((viewer) => viewer.projectId) : null;
  return {
    kind: 'member',
    userId,
    membershipId: id,
    organisationId,
    role,
    name: user.name,
    email: user.email,
    projectIds,
  };
}
