import { AppError } from '../errors';
import { env } from '../env';

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses (403) a request that changes something unless a page of ours sent it: the session cookie alone proves only who
 * the browser belongs to. Browsers send Sec-Fetch-Site to https and loopback addresses and Origin everywhere; a request
 * with neither was not made by a page and is refused too.
 */
export function demandSameOrigin(request: Request): void {
  if (SAFE_METHODS.has(request.method)) return;
  const site = request.headers.get('sec-fetch-site');
  const trusted = site === null ? isOurs(request) : site === 'same-origin';
  if (trusted) return;
  const detail = 'This request did not come from a page of Elbowroom. Open Elbowroom itself and try again.';
  throw new AppError({ status: 403, code: 'cross_origin', detail });
}

function isOurs(request: Request): boolean {
  const origin = request.headers.get('origin');
  if (origin === null || !URL.canParse(origin)) return false;
  const { host } = new URL(origin);
  return host === request.headers.get('host') || host === new URL(env.APP_URL).host;
}
