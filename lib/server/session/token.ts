import { decode, encode } from 'next-auth/jwt';
import { z } from 'zod';
import { env } from '../env';
import { SESSION_MAX_AGE_S } from './cookie';

/** What the encrypted cookie says: who signed in, and after which password. Role and membership are never read from it. */
const claimsSchema = z.object({ sub: z.uuid(), generation: z.number().int() });
export type SessionClaims = z.infer<typeof claimsSchema>;

/** Null for a cookie that is forged, expired or of another make. */
export async function decodeSession(cookie: string): Promise<SessionClaims | null> {
  try {
    return claimsSchema.parse(await decode({ token: cookie, secret: env.AUTH_SECRET }));
  } catch {
    return null;
  }
}

/** The cookie that a sign-in sets; tests make theirs with it. */
export function encodeSession(claims: SessionClaims): Promise<string> {
  return encode({ token: claims, secret: env.AUTH_SECRET, maxAge: SESSION_MAX_AGE_S });
}
