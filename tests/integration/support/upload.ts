import type { TestMember } from '@/tests/factories';

type Handler = (request: Request, context?: { params: Promise<object> }) => Promise<Response>;

interface UploadOptions {
  as: Pick<TestMember, 'cookie'>;
  projectId: string;
  file?: { name: string; bytes: Uint8Array };
  name?: string;
}

/** The multipart form that the upload page sends. */
export function uploadForm({ file, name }: Pick<UploadOptions, 'file' | 'name'>): FormData {
  const form = new FormData();
  if (file) form.set('file', new File([new Uint8Array(file.bytes)], file.name));
  if (name !== undefined) form.set('name', name);
  return form;
}

/** Calls the upload route with any body; `headers` on top of what the body brings along. */
export function callUpload(
  handler: Handler,
  { as, projectId }: Pick<UploadOptions, 'as' | 'projectId'>,
  body: BodyInit,
  headers: Record<string, string> = {},
): Promise<Response> {
  const request = new Request('http://elbowroom.test/api/floor-plans', {
    method: 'POST',
    body,
    headers: { cookie: as.cookie, 'sec-fetch-site': 'same-origin', ...headers },
    // Node asks for this with a stream; the type of the DOM does not know it.
    ...{ duplex: 'half' },
  });
  return handler(request, { params: Promise.resolve({ projectId }) });
}

export function upload(handler: Handler, options: UploadOptions): Promise<Response> {
  return callUpload(handler, options, uploadForm(options));
}
