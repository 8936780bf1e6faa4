import { SESSION_MAX_AGE_S, useSecureCookies } from '../session/cookie';
import { guestMarkOf } from '../remarks/author';

const COOKIE = 'elbowroom-guest';

/** The mark that this browser got when its guest last wrote; null without one. */
export function readGuestMark(request: Request): string | null {
  const cookies = (request.headers.get('cookie') ?? '').split(';').map((part) => part.trim());
  return cookies.find((cookie) => cookie.startsWith(`${COOKIE}=`))?.slice(COOKIE.length + 1) ?? null;
}

/** Lets the guest's browser know its own remarks again. Only pages under a share link get to see it. */
export function guestMarkHeader(email: string): Record<string, string> {
  const flags = `Path=/api/share; Max-Age=${SESSION_MAX_AGE_S}; HttpOnly; SameSite=Strict${useSecureCookies ? '; Secure' : ''}`;
  return { 'set-cookie': `${COOKIE}=${guestMarkOf(email)}; ${flags}` };
}
