import type { z } from 'zod';
import type { invitationAcceptSchema } from '@/lib/contracts/accounts';
import { AuditEvent, Membership, Project, User } from '@/models';
import { inTransaction } from '../database';
import type { Transaction } from '../database';
import { conflict } from '../errors';
import { setViewerProjects } from '../members/data';
import { hashPassword } from '../passwords';
import { openInvitation } from './data';

/**
 * Makes the invited person a member, with the name and password they choose. Somebody who was a member before and was
 * removed comes back under the same account. Throws 404 `link_not_valid`, 409 `already_member`.
 */
export async function acceptInvitation(token: string, request: z.output<typeof invitationAcceptSchema>): Promise<void> {
  // Cheap refusal first; and hashing takes a while, so it is done before the row is locked.
  await openInvitation(token);
  const passwordHash = await hashPassword(request.password);
  await inTransaction(async (transaction) => {
    const invitation = await openInvitation(token, transaction);
    const { organisationId, email, role, projectIds } = invitation;
    const user = await takeAccount({ email, name: request.name, passwordHash }, transaction);
    const membership = await Membership.create({ organisationId, userId: user.id, role }, { transaction });
    if (role === 'viewer') {
      const projects = await Project.findAll({ where: { organisationId, id: projectIds }, transaction });
      await setViewerProjects(
        membership,
        projects.map((project) => project.id),
        transaction,
      );
    }
    await invitation.update({ acceptedAt: new Date() }, { transaction });
    const event = { organisationId, userId: user.id, action: 'invitation.accepted', subjectId: invitation.id };
    await AuditEvent.create(event, { transaction });
  });
}

interface NewAccount {
  email: string;
  name: string;
  passwordHash: string;
}

/** The link came by mail, so whoever holds it owns the address, just as with a forgotten password. */
async function takeAccount({ email, name, passwordHash }: NewAccount, transaction: Transaction): Promise<User> {
  const known = await User.findOne({ where: { email }, lock: transaction.LOCK.UPDATE, transaction });
  if (!known) return User.create({ email, name, passwordHash }, { transaction });
  if (await Membership.findOne({ where: { userId: known.id }, transaction })) {
    const detail = 'This address already belongs to an organisation. Ask to be invited under another address.';
    throw conflict('already_member', detail);
  }
  return known.update({ name, passwordHash, sessionGeneration: known.sessionGeneration + 1 }, { transaction });
}
