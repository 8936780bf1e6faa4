import type { z } from 'zod';
import type { Member, memberChangeSchema } from '@/lib/contracts/accounts';
import { Membership } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { invalid, notFound } from '../errors';
import { demandRole } from '../policy';
import type { Actor } from '../policy';
import { demandProjects, getMember, keepOneAdmin, setViewerProjects } from './data';

/**
 * Gives a member another role, or a viewer other projects.
 * Throws 404 for a foreign member, 409 `last_admin`, 422 for projects given to somebody who sees all of them anyway.
 */
export async function changeMember(
  actor: Actor,
  memberId: string,
  change: z.output<typeof memberChangeSchema>,
): Promise<Member> {
  demandRole(actor, 'admin');
  const { organisationId } = actor;
  return inTransaction(async (transaction) => {
    const where = { id: memberId, organisationId };
    const membership = await Membership.findOne({ where, lock: transaction.LOCK.UPDATE, transaction });
    if (!membership) throw notFound('member');

    const before = membership.role;
    const role = change.role ?? before;
    if (role !== 'viewer' && change.projectIds?.length)
      throw invalid('projectIds', 'Only a viewer is limited to projects; every other role sees all of them.');
    if (before === 'admin' && role !== 'admin') await keepOneAdmin(organisationId, memberId, transaction);

    await membership.update({ role }, { transaction });
    if (role !== 'viewer') await setViewerProjects(membership, [], transaction);
    else if (change.projectIds) {
      await demandProjects(organisationId, change.projectIds, transaction);
      await setViewerProjects(membership, change.projectIds, transaction);
    }
    const details = { from: before, to: role, projectIds: change.projectIds };
    await recordAudit(actor, { action: 'member.changed', subjectId: memberId, details }, transaction);
    return getMember(actor, memberId, transaction);
  });
}
