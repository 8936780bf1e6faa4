import { MAP_TILES_MEDIA_TYPE } from '@/lib/contracts/maps';
import type { StoredTiles } from './read-tiles';

/** The tiles as an answer; 304 where the reader has them. The browser may keep them but asks each time whether it still may. */
export function tilesResponse(request: Request, { key, stream }: StoredTiles): Response {
  const headers = { 'cache-control': 'private, no-cache', etag: `"${key}"` };
  if (request.headers.get('if-none-match') === headers.etag) return new Response(null, { status: 304, headers });
  return new Response(stream(), { headers: { ...headers, 'content-type': MAP_TILES_MEDIA_TYPE } });
}
