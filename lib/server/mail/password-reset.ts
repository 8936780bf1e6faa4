import { Membership, PasswordReset, User } from '@/models';
import { env } from '../env';
import { derivedToken, hashToken } from '../tokens';
import type { Message } from './message';
import type { Envelope } from './compose';

const VALID_MINUTES = 60;

/** The row takes the mail's id, so a mail that is sent again carries the same link with the same end. */
export async function composePasswordReset(_data: object, { id, to }: Envelope): Promise<Message | null> {
  const membership = { model: Membership, as: 'membership', required: true };
  const user = await User.findOne({ where: { email: to }, include: membership });
  if (!user) return null;
  const token = derivedToken('password-reset', id);
  const [reset] = await PasswordReset.findOrCreate({
    where: { id },
    defaults: {
      id,
      userId: user.id,
      tokenHash: hashToken(token),
      expiresAt: new Date(Date.now() + VALID_MINUTES * 60 * 1000),
    },
  });
  if (reset.usedAt || reset.expiresAt <= new Date()) return null;
  return {
    subject: 'Choose a new password for Elbowroom',
    paragraphs: [
      `Hello ${user.name},`,
      `somebody asked for a new password for your account. If it was you, use the link below; it works once and for ${VALID_MINUTES} minutes. You will be signed out everywhere.`,
    ],
    action: { label: 'Choose a new password', url: `${env.APP_URL}/reset-password/${token}` },
    reason: 'If it was not you, do nothing: your password stays as it is.',
  };
}
