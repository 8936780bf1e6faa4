import { Membership } from '@/models';
import { recordAudit } from '../audit';
import { inTransaction } from '../database';
import { notFound } from '../errors';
import { demandRole } from '../policy';
import type { Actor } from '../policy';
import { keepOneAdmin } from './data';

/** What they wrote and made stays; they are out with their next request. Throws 404 for a foreign member, 409 `last_admin`. */
export async function removeMember(actor: Actor, memberId: string): Promise<void> {
  demandRole(actor, 'admin');
  const { organisationId } = actor;
  await inTransaction(async (transaction) => {
    await keepOneAdmin(organisationId, memberId, transaction);
    const removed = await Membership.destroy({ where: { id: memberId, organisationId }, transaction });
    if (removed === 0) throw notFound('member');
    await recordAudit(actor, { action: 'member.removed', subjectId: memberId }, transaction);
  });
}
