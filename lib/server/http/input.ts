import type { z } from 'zod';
import { AppError, invalidFields, notFound, tooLarge } from '../errors';

/** Enough for a thousand items with long outlines; pictures go by `body: 'stream'`. */
const JSON_LIMIT_BYTES = 4 * 1024 * 1024;

/** Throws 404: an address with a malformed id leads nowhere, just as one with an unknown id. */
export function parseParams<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const result = schema.safeParse(value);
  if (!result.success) throw notFound('page');
  return result.data;
}

/** Throws 422 with one entry a refused field. */
export function parseInput<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const result = schema.safeParse(value);
  if (result.success) return result.data;
  throw invalidFields(
    result.error.issues.map((issue) => ({ path: issue.path.map(String).join('.'), message: issue.message })),
  );
}

/** Throws 415 for another media type, 413 above the limit, 400 for what is not JSON. */
export async function readJson(request: Request): Promise<unknown> {
  const mediaType = request.headers.get('content-type')?.split(';')[0].trim().toLowerCase();
  if (mediaType !== 'application/json')
    throw new AppError({ status: 415, code: 'unsupported_media_type', detail: 'Send application/json.' });
  const text = await readText(request);
  try {
    return JSON.parse(text);
  } catch {
    throw new AppError({ status: 400, code: 'malformed_json', detail: 'The request is not well-formed JSON.' });
  }
}

/** Counts while it reads: a content-length header is a claim, not a fact. */
async function readText(request: Request): Promise<string> {
  const decoder = new TextDecoder();
  let bytes = 0;
  let text = '';
  const reader = request.body?.getReader();
  while (reader) {
    const { done, value } = await reader.read();
    if (done) break;
    bytes += value.byteLength;
    if (bytes > JSON_LIMIT_BYTES) {
      await reader.cancel();
      throw tooLarge('The request is larger than 4 MB. Send it in smaller parts.');
    }
    text += decoder.decode(value, { stream: true });
  }
  return text + decoder.decode();
}
