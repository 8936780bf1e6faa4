import { inTransaction } from '../database';
import { sendMailLater } from '../mail';
import { takePasswordReset } from '../rate-limit';

/**
 * Queues the mail with the link. Whether the address has an account is looked up by the mail job alone, so that neither the
 * answer nor its time tells a stranger. Throws 429 where one source asks for many people.
 */
export async function requestPasswordReset(email: string, clientAddress: string): Promise<void> {
  if (!(await takePasswordReset(email, clientAddress))) return;
  await inTransaction((transaction) => sendMailLater({ to: email, template: 'password-reset', data: {} }, transaction));
}
