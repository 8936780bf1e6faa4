import { z } from 'zod';
import { emailSchema } from '@/lib/contracts/common';
import { User, Membership } from '@/models';
import { verifyPassword } from '../passwords';
import { clientAddress, signInLimit } from '../rate-limit';

const credentialsSchema = z.object({ email: emailSchema, password: z.string().min(1).max(200) });

/** The error code a sign-in answers with when somebody has tried too often. */
export const TOO_MANY_ATTEMPTS = 'too_many_attempts';

/** The person whose password this is, or null. Throws `too_many_attempts` after too many wrong ones. */
export async function checkCredentials(
  credentials: unknown,
  headers: Headers | Record<string, unknown> | undefined,
): Promise<{ id: string; generation: number } | null> {
  const parsed = credentialsSchema.safeParse(credentials);
  if (!parsed.success) return null;
  const { email, password } = parsed.data;
  const attempt = await signInLimit.take(email, clientAddress(headers));
  if (!attempt.allowed) throw new Error(TOO_MANY_ATTEMPTS);

  const user = await User.findOne({ where: { email }, include: { model: Membership, as: 'membership' } });
  const matches = await verifyPassword(user?.passwordHash ?? null, password);
  if (!user?.membership || !matches) return null;
  await attempt.forgive();
  return { id: user.id, generation: user.sessionGeneration };
}
