import { Op, type Transaction } from 'sequelize';
import type { Person } from '@/lib/contracts/remarks';
import { Membership, ProjectViewer, User } from '@/models';
import { roleIsAtLeast, type MemberActor } from '../policy';
import { findProject } from '../projects/data';

/** Members who can see the project, by name: all who plan in the organisation, and the project's viewers. */
export async function peopleOf(actor: MemberActor, projectId: string, transaction?: Transaction): Promise<Person[]> {
  const project = await findProject(actor, projectId, transaction);
  const grants = await ProjectViewer.findAll({ where: { projectId: project.id }, transaction });
  const memberships = await Membership.findAll({
    where: {
      organisationId: project.organisationId,
      [Op.or]: [{ role: { [Op.ne]: 'viewer' } }, { id: grants.map(({ membershipId }) => membershipId) }],
    },
    include: [{ model: User, as: 'user', required: true }],
    transaction,
  });
  const people = memberships.flatMap(({ user, role }): Person[] =>
    user ? [{ id: user.id, name: user.name, side: roleIsAtLeast(role, 'planner') ? 'integrator' : 'customer' }] : [],
  );
  return people.sort((a, b) => a.name.localeCompare(b.name));
}
