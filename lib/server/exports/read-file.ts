import { LAYOUT_FILE_MAX_BYTES } from '@/lib/contracts/layout-file';
import { tooLarge } from '../errors';

/** The body of a request up to the limit; counted while it comes, since a content-length header is only a claim. Throws 413. */
export async function readFile(request: Request): Promise<Uint8Array> {
  const chunks: Uint8Array[] = [];
  let bytes = 0;
  const reader = request.body?.getReader();
  while (reader) {
    const { done, value } = await reader.read();
    if (done) break;
    bytes += value.byteLength;
    if (bytes > LAYOUT_FILE_MAX_BYTES) {
      await reader.cancel();
      throw tooLarge('A layout file has at most 64 MB. Export it without the floor plan, or with a smaller one.');
    }
    chunks.push(value);
  }
  return Buffer.concat(chunks);
}
