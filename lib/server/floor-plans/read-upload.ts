import { FLOOR_PLAN_MAX_BYTES } from '@/lib/contracts/floor-plans';
import { refuse } from './refusals';

export interface Upload {
  readonly bytes: Uint8Array<ArrayBuffer>;
  /** What the plan is called: the form's `name`, else the name of the file without its ending. */
  readonly name: string;
}

/** What the multipart form may weigh beside the file itself. */
const FORM_ALLOWANCE_BYTES = 64 * 1024;
const NAME_MAX_LENGTH = 120;

/** Passes bytes on until there are too many of them: a Content-Length that lies changes nothing. */
function limited(body: ReadableStream<Uint8Array>, most: number, onExceeded: () => void): ReadableStream<Uint8Array> {
  let bytes = 0;
  return body.pipeThrough(
    new TransformStream<Uint8Array, Uint8Array>({
      transform(chunk, controller) {
        bytes += chunk.byteLength;
        if (bytes <= most) return controller.enqueue(chunk);
        onExceeded();
        return controller.error(new Error('Too many bytes'));
      },
    }),
  );
}

function planName(form: FormData, fileName: string): string {
  const given = form.get('name');
  const name = typeof given === 'string' ? given.trim() : '';
  const fromFile = fileName.replace(/\.[^.]*$/, '').trim();
  return (name || fromFile || 'Floor plan').slice(0, NAME_MAX_LENGTH);
}

/**
 * Reads the multipart form of an upload, holding at most `maxBytes` (40 MB) of the file. Throws AppError: `file_too_large` (413),
 * `upload_broken`, `file_missing` and `file_empty` (400).
 */
export async function readUpload(request: Request, maxBytes = FLOOR_PLAN_MAX_BYTES): Promise<Upload> {
  const most = maxBytes + FORM_ALLOWANCE_BYTES;
  const tooManyBytes = () => refuse.tooManyBytes(maxBytes / 1024 / 1024);
  const contentType = request.headers.get('content-type') ?? '';
  if (!request.body || !contentType.startsWith('multipart/form-data')) throw refuse.missing();
  if (Number(request.headers.get('content-length') ?? 0) > most) throw tooManyBytes();

  let exceeded = false;
  const body = limited(request.body, most, () => (exceeded = true));
  let form: FormData;
  try {
    form = await new Response(body, { headers: { 'content-type': contentType } }).formData();
  } catch {
    throw exceeded ? tooManyBytes() : refuse.broken();
  }

  const file = form.get('file');
  if (!(file instanceof File)) throw refuse.missing();
  if (file.size > maxBytes) throw tooManyBytes();
  if (file.size === 0) throw refuse.empty();
  return { bytes: new Uint8Array(await file.arrayBuffer()), name: planName(form, file.name) };
}
