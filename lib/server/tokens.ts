import { createHash, createHmac, hkdfSync, randomBytes } from 'node:crypto';
import { env } from './env';

/** 256 random bits, base64url: 43 characters. */
export function randomToken(): string {
  return randomBytes(32).toString('base64url');
}

/** SHA-256, hexadecimal. What is kept of a token: it cannot be turned back, and 256 bits cannot be guessed. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/**
 * The token of a link that a queued mail carries, made from the row's id and the server's secret. So it never lies in the
 * queue or the database, and a mail that is sent again carries the same link.
 */
export function derivedToken(purpose: 'invitation' | 'password-reset' | 'guest' | 'unsubscribe', id: string): string {
  const key = Buffer.from(hkdfSync('sha256', env.AUTH_SECRET, '', 'elbowroom link tokens', 32));
  return createHmac('sha256', key).update(`${purpose}:${id}`).digest('base64url');
}
