import type { z } from 'zod';
import { readAnswer } from './fetcher';
import { problemFrom, unreachable } from './problem-error';

interface UploadOptions<Schema extends z.ZodType> {
  schema: Schema;
  /** Share of the bytes that left, 0 … 1. */
  onProgress?: (share: number) => void;
  signal?: AbortSignal;
}

/**
 * POSTs a form and tells how far it has come, which fetch cannot. Throws ProblemError; an AbortError when cancelled.
 */
export function upload<Schema extends z.ZodType>(
  url: string,
  form: FormData,
  { schema, onProgress, signal }: UploadOptions<Schema>,
): Promise<z.infer<Schema>> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', url);
    request.setRequestHeader('Accept', 'application/json');
    request.upload.onprogress = (event) => {
      if (event.lengthComputable && event.total > 0) onProgress?.(event.loaded / event.total);
    };
    request.onload = () => {
      let body: unknown = null;
      try {
        body = JSON.parse(request.responseText);
      } catch {
        // No problem document: problemFrom speaks from the status alone.
      }
      try {
        if (request.status >= 200 && request.status < 300) resolve(readAnswer(schema, body));
        else reject(problemFrom(request.status, body));
      } catch (error) {
        reject(error instanceof Error ? error : unreachable());
      }
    };
    request.onerror = () => reject(unreachable());
    request.onabort = () => reject(new DOMException('The upload was cancelled.', 'AbortError'));
    signal?.addEventListener('abort', () => request.abort());
    if (signal?.aborted) request.abort();
    else request.send(form);
  });
}
