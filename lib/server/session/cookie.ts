import { env } from '../env';

/** A session ends after this time without a visit. */
export const SESSION_MAX_AGE_S = 14 * 24 * 3600;

export const useSecureCookies = new URL(env.APP_URL).protocol === 'https:';

/** Cookies are shared by all ports of a host, so the prefix `__Host-` binds it where https makes that possible. */
export const SESSION_COOKIE = useSecureCookies ? '__Host-elbowroom-session' : 'elbowroom-session';

/** Value of the session cookie in a request, an encrypted JWT whose characters need no escapes; null without one. */
export function readSessionCookie(request: Request): string | null {
  for (const part of (request.headers.get('cookie') ?? '').split(';')) {
    const [name, ...value] = part.trim().split('=');
    if (name === SESSION_COOKIE) return value.join('=');
  }
  return null;
}
