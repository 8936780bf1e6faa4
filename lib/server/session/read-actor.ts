import { Membership, ProjectViewer, User } from '@/models';
import type { MemberActor } from '../policy';
import { readSessionCookie } from './cookie';
import { decodeSession } from './token';

/**
 * Who asks. Membership, role and projects are read from the database each time, so that somebody removed, moved to another
 * role or given a new password is out with their next request, however long their cookie would last.
 */
export async function readActor(request: Request): Promise<MemberActor | null> {
  const cookie = readSessionCookie(request);
  const claims = cookie && (await decodeSession(cookie));
  if (!claims) return null;
  const membership = await Membership.findOne({
    where: { userId: claims.sub },
    include: [
      { model: User, as: 'user', required: true, where: { sessionGeneration: claims.generation } },
      { model: ProjectViewer, as: 'projectViewers' },
    ],
  });
  return membership && presentActor(membership);
}

function presentActor(membership: Membership): MemberActor {
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
