import type { FloorPlan } from '@/models';
import { notFound } from '../errors';
import { getObject } from '../object-store';
import { pictureKey, widthAtHand } from './keys';

/**
 * The stored picture nearest to the width asked for, as a response. A floor plan's pictures never change (a new upload is a new
 * plan), so browsers may keep them; shared caches may not. `extra` headers come on top.
 */
export async function pictureResponse(
  floorPlan: FloorPlan,
  widthPx: number,
  request: Request,
  extra: Record<string, string> = {},
): Promise<Response> {
  const width = widthAtHand(floorPlan.pictureWidths, widthPx);
  const headers = {
    'cache-control': 'private, max-age=31536000, immutable',
    etag: `"${floorPlan.id}-${width}"`,
    'x-content-type-options': 'nosniff',
    'content-disposition': 'inline',
    ...extra,
  };
  if (request.headers.get('if-none-match') === headers.etag) return new Response(null, { status: 304, headers });
  const object = await getObject(pictureKey(floorPlan.objectPrefix, width));
  if (!object) throw notFound('picture');
  return new Response(object.body, {
    headers: { ...headers, 'content-type': object.contentType, 'content-length': String(object.body.byteLength) },
  });
}
