import { Layout, Membership, Project, Revision, User } from '@/models';
import type { Transaction } from '../database';
import { roleIsAtLeast } from '../policy';

export interface Recipient {
  userId: string;
  name: string;
  email: string;
}

/**
 * Who is told of a remark: those who planned the layout and issued the revision, as far as they still plan in the
 * organisation; if none of them does, its admins, so that no remark goes unread.
 * Not scoped by an actor: call it with a revision that the actor has been shown to reach.
 */
export async function planningRecipients(revisionId: string, transaction: Transaction): Promise<Recipient[]> {
  const revision = await Revision.findByPk(revisionId, {
    include: {
      model: Layout,
      as: 'layout',
      required: true,
      include: [{ model: Project, as: 'project', required: true }],
    },
    rejectOnEmpty: true,
    transaction,
  });
  const layout = revision.layout;
  if (!layout?.project) throw new Error('A revision was read without its layout');

  const memberships = await Membership.findAll({
    where: { organisationId: layout.project.organisationId },
    include: { model: User, as: 'user', required: true },
    order: [['createdAt', 'ASC']],
    transaction,
  });
  const planned = new Set([layout.createdBy, revision.issuedBy]);
  const planners = memberships.filter(({ userId, role }) => planned.has(userId) && roleIsAtLeast(role, 'planner'));
  const told = planners.length > 0 ? planners : memberships.filter(({ role }) => role === 'admin');
  return told.flatMap(({ user }) => (user ? [{ userId: user.id, name: user.name, email: user.email }] : []));
}
