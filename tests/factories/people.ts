import type { Role } from '@/lib/contracts/common';
import type { MemberActor } from '@/lib/server/policy';
import { hashPassword } from '@/lib/server/passwords';
import { SESSION_COOKIE } from '@/lib/server/session/cookie';
import { encodeSession } from '@/lib/server/session/token';
import { Membership, Organisation, ProjectViewer, User } from '@/models';
import { unique, uniqueEmail } from './counter';

export const PASSWORD = 'correct horse battery';

// Hashing is slow on purpose; one hash serves all people of a test file.
let passwordHash: Promise<string> | null = null;

export function createOrganisation(name = unique('Organisation')): Promise<Organisation> {
  return Organisation.create({ name });
}

export async function createUser(options: { email?: string; name?: string } = {}): Promise<User> {
  passwordHash ??= hashPassword(PASSWORD);
  return User.create({
    email: options.email ?? uniqueEmail(),
    name: options.name ?? unique('Person'),
    passwordHash: await passwordHash,
  });
}

export interface TestMember {
  user: User;
  membership: Membership;
  organisationId: string;
  /** What the session would make of them. */
  actor: MemberActor;
  /** Value of a Cookie header, as a sign-in sets it. */
  cookie: string;
}

interface MemberOptions {
  organisationId?: string;
  /** For a viewer: what they may look at. */
  projectIds?: string[];
  name?: string;
}

/** A member with PASSWORD; without `organisationId` of an organisation of their own. */
export async function createMember(role: Role, options: MemberOptions = {}): Promise<TestMember> {
  const organisationId = options.organisationId ?? (await createOrganisation()).id;
  const user = await createUser({ name: options.name });
  const membership = await Membership.create({ organisationId, userId: user.id, role });
  const projectIds = options.projectIds ?? [];
  const membershipId = membership.id;
  await ProjectViewer.bulkCreate(projectIds.map((projectId) => ({ projectId, membershipId, organisationId })));
  const actor: MemberActor = {
    kind: 'member',
    userId: user.id,
    membershipId,
    organisationId,
    role,
    name: user.name,
    email: user.email,
    projectIds: role === 'viewer' ? projectIds : null,
  };
  return { user, membership, organisationId, actor, cookie: await cookieOf(user) };
}

/** The cookie that a sign-in with the present password would set. */
export async function cookieOf(user: User): Promise<string> {
  return `${SESSION_COOKIE}=${await encodeSession({ sub: user.id, generation: user.sessionGeneration })}`;
}
