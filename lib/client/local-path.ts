const HERE = 'http://here.invalid';

/**
 * A return address that may be followed: a path of this site, never another site's address dressed as one
 * (`//elsewhere`, `/\elsewhere`, `javascript:`), and never the sign-in page itself. Anything else gives `fallback`.
 */
export function localPath(address: string | null | undefined, fallback = '/projects'): string {
  if (!address?.startsWith('/')) return fallback;
  let url: URL;
  try {
    url = new URL(address, HERE);
  } catch {
    return fallback;
  }
  if (url.origin !== HERE || /^\/(sign-in|api)(\/|$)/.test(url.pathname)) return fallback;
  // Dot segments can leave two slashes at the start, which a browser would read as another site.
  if (url.pathname.startsWith('//')) return fallback;
  return url.pathname + url.search + url.hash;
}
