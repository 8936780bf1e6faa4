import type { Member } from '@/lib/contracts/accounts';
import { Membership, Project, ProjectViewer, User } from '@/models';
import type { Transaction } from '../database';
import { conflict, invalid, notFound } from '../errors';
import { demandRole } from '../policy';
import type { Actor, MemberActor } from '../policy';
import { presentMember } from './present';

const parts = [
  { model: User, as: 'user', required: true },
  { model: ProjectViewer, as: 'projectViewers' },
];

/** Everyone in the organisation, by name. Customers do not see who else there is. */
export async function listMembers(actor: Actor): Promise<Member[]> {
  demandRole(actor, 'planner');
  const memberships = await Membership.findAll({
    where: { organisationId: actor.organisationId },
    include: parts,
    order: [
      [{ model: User, as: 'user' }, 'name', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  return memberships.map(presentMember);
}

/** Throws 404 for a member of another organisation. */
export async function getMember(actor: MemberActor, memberId: string, transaction: Transaction): Promise<Member> {
  const membership = await Membership.findOne({
    where: { id: memberId, organisationId: actor.organisationId },
    include: parts,
    transaction,
  });
  if (!membership) throw notFound('member');
  return presentMember(membership);
}

/**
 * Locks all admins of the organisation, so that two of them cannot remove each other at the same moment.
 * Throws 409 `last_admin` if the given member is the only one.
 */
export async function keepOneAdmin(organisationId: string, memberId: string, transaction: Transaction): Promise<void> {
  const admins = await Membership.findAll({
    where: { organisationId, role: 'admin' },
    order: [['id', 'ASC']],
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  if (admins.length === 1 && admins[0].id === memberId)
    throw conflict('last_admin', 'This is the only admin. Make somebody else admin first.');
}

/** Throws 422 unless all these projects are the organisation's own. */
export async function demandProjects(
  organisationId: string,
  projectIds: readonly string[],
  transaction: Transaction,
): Promise<void> {
  const ids = [...new Set(projectIds)];
  const known = ids.length && (await Project.count({ where: { organisationId, id: ids }, transaction }));
  if (known !== ids.length) throw invalid('projectIds', 'One of these projects does not exist any more. Choose again.');
}

/** Sets which projects a viewer may look at. */
export async function setViewerProjects(
  membership: Membership,
  projectIds: readonly string[],
  transaction: Transaction,
): Promise<void> {
  const { id: membershipId, organisationId } = membership;
  await ProjectViewer.destroy({ where: { membershipId }, transaction });
  const rows = [...new Set(projectIds)].map((projectId) => ({ projectId, membershipId, organisationId }));
  await ProjectViewer.bulkCreate(rows, { transaction });
}
