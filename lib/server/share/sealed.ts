import { z } from 'zod';

/** The token in the address of a shared revision: 32 random bytes, base64url. */
export const tokenParam = z.string().regex(/^[\w-]{43}$/);

type Handler = (request: Request, context?: { params: Promise<object> }) => Promise<Response>;

/**
 * Sets what every answer under a share link needs, refusals included: the address is a key, so it stays out of caches, referrers
 * and search engines.
 */
export function sealed<H extends Handler>(handler: H): Handler & Pick<H, Exclude<keyof H, keyof Handler>> {
  const answer: Handler = async (request, context) => {
    const response = await handler(request, context);
    response.headers.set('cache-control', 'no-store');
    response.headers.set('referrer-policy', 'no-referrer');
    response.headers.set('x-robots-tag', 'noindex, nofollow');
    return response;
  };
  // What the route says of itself goes on with it.
  return Object.assign(answer, handler);
}
