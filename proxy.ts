import { NextResponse } from 'next/server';
import type { NextRequest } from 'next/server';

/**
 * Gives every page a content security policy whose nonce only our own scripts carry. Next reads the nonce from the request
 * and puts it on them, which it can do only for pages rendered on request: app/layout.tsx says that all of them are.
 */
export function proxy(request: NextRequest): NextResponse {
  const nonce = Buffer.from(crypto.randomUUID()).toString('base64');
  const policy = contentSecurityPolicy(nonce);
  const headers = new Headers(request.headers);
  headers.set('x-nonce', nonce);
  headers.set('content-security-policy', policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', policy);
  return response;
}

function contentSecurityPolicy(nonce: string): string {
  // React's development build evaluates strings to rebuild stack traces; the production build does not.
  const development = process.env.NODE_ENV === 'development' ? " 'unsafe-eval'" : '';
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${development}`,
    // Style attributes place what is dragged and measured; styles cannot run code.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' blob: data:",
    "worker-src 'self' blob:",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}

export const config = {
  // Pages only. A request that passes through here has its body cut off at 10 MB, so /api must stay out: floor plans are
  // uploaded there.
  matcher: ['/((?!api/|_next/static|_next/image|fonts/|icon.svg|favicon.ico).*)'],
};
