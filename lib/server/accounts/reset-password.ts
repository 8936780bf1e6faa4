import { Op } from 'sequelize';
import { AuditEvent, Membership, PasswordReset, User } from '@/models';
import { inTransaction } from '../database';
import { linkNotValid } from '../errors';
import { hashPassword } from '../passwords';
import { hashToken } from '../tokens';

/**
 * Sets a new password by the link of a mail, once. Every session from before it is over, and so is every other link of the
 * same person. Throws 404 `link_not_valid`.
 */
export async function resetPassword(token: string, password: string): Promise<void> {
  // Before the row is locked: hashing takes a while.
  const passwordHash = await hashPassword(password);
  await inTransaction(async (transaction) => {
    const open = { usedAt: null, expiresAt: { [Op.gt]: new Date() } };
    const reset = await PasswordReset.findOne({
      where: { tokenHash: hashToken(token), ...open },
      lock: transaction.LOCK.UPDATE,
      transaction,
    });
    if (!reset) throw linkNotValid();
    const where = { userId: reset.userId, usedAt: null };
    await PasswordReset.update({ usedAt: new Date() }, { where, transaction });
    await User.update({ passwordHash }, { where: { id: reset.userId }, transaction });
    await User.increment('sessionGeneration', { where: { id: reset.userId }, transaction });
    const { userId } = reset;
    const membership = await Membership.findOne({ where: { userId }, transaction });
    if (!membership) return;
    const { organisationId } = membership;
    await AuditEvent.create({ organisationId, userId, action: 'account.password_reset' }, { transaction });
  });
}
