import sharp from 'sharp';
import { DAY_PALETTE, NIGHT_PALETTE } from '@/lib/layout/palette';
import { thumbnailSvg } from '@/lib/layout/thumbnail-svg';
import type { ThumbnailQuery } from '@/lib/contracts/layouts';
import type { MemberActor } from '../policy';
import { findLayout, storedItemsOf } from './data';

const SHAPE = 0.625;
/** Drawn twice as fine as asked for, for screens that show it so. */
const DENSITY = 2;

/**
 * A small picture of the draft, made anew when it is asked for and kept by the browser until the layout's version moves on. Throws
 * not_found.
 */
export async function thumbnailResponse(
  actor: MemberActor,
  layoutId: string,
  { width, board }: ThumbnailQuery,
  request: Request,
): Promise<Response> {
  const layout = await findLayout(actor, layoutId);
  const headers = {
    'cache-control': 'private, no-cache',
    etag: `"${layout.id}-${layout.version}-${width}-${board}"`,
    'x-content-type-options': 'nosniff',
  };
  if (request.headers.get('if-none-match') === headers.etag) return new Response(null, { status: 304, headers });
  const items = (await storedItemsOf(layout.id)).map(({ item }) => item);
  const size = { widthPx: width, heightPx: Math.round(width * SHAPE) };
  const svg = thumbnailSvg(items, board === 'night' ? NIGHT_PALETTE : DAY_PALETTE, size);
  const picture = await sharp(Buffer.from(svg), { density: 72 * DENSITY })
    .png({ palette: true })
    .toBuffer();
  return new Response(new Uint8Array(picture), {
    headers: { ...headers, 'content-type': 'image/png', 'content-length': String(picture.byteLength) },
  });
}
