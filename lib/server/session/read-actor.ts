import { Membership, ProjectViewer, User } from '@/models';
import type { MemberActor } from '../policy';
import { actorOfToken } from '../api-tokens/actor-of-token';
import { readBearer } from './bearer';
import { readSessionCookie } from './cookie';
import { presentActor } from './present-actor';
import { decodeSession } from './token';

/**
 * Who asks. Membership, role and projects are read from the database each time, so that somebody removed, moved to another
 * role or given a new password is out with their next request, however long their cookie would last.
 */
export async function readActor(request: Request): Promise<MemberActor | null> {
  // A request that names a token is judged by it alone: a wrong one must not fall back on whoever is signed in.
  const bearer = readBearer(request);
  if (bearer !== null) return actorOfToken(bearer);
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
