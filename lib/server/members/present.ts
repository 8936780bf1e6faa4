import type { Member } from '@/lib/contracts/accounts';
import type { Membership } from '@/models';

/** `membership` must have been read with its user and its project viewers. */
export function presentMember(membership: Membership): Member {
  const { user, projectViewers } = membership;
  if (!user || !projectViewers) throw new Error('A membership was read without its user or its projects');
  return {
    id: membership.id,
    userId: membership.userId,
    name: user.name,
    email: user.email,
    role: membership.role,
    projectIds: membership.role === 'viewer' ? projectViewers.map((viewer) => viewer.projectId) : [],
    joinedAt: membership.createdAt.toISOString(),
  };
}
