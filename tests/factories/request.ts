import { randomBytes } from 'node:crypto';
import type { TestMember } from './people';

export type Handler = (request: Request, context?: { params: Promise<object> }) => Promise<Response>;

export interface CallOptions {
  /** Nobody without it. */
  as?: Pick<TestMember, 'cookie'> | null;
  method?: string;
  /** Path and query; the host is ours. */
  path?: string;
  params?: object;
  /** Sent as JSON, or as the form that it is. */
  body?: unknown;
  /** Replaces or adds to what a page of ours would send; null leaves one out. */
  headers?: Record<string, string | null>;
}

/** Calls a route handler the way the server does for a page of ours. */
export function callRoute(handler: Handler, options: CallOptions = {}): Promise<Response> {
  const headers = new Headers({ 'sec-fetch-site': 'same-origin', 'x-forwarded-for': someAddress() });
  if (options.as) headers.set('cookie', options.as.cookie);
  const isForm = options.body instanceof FormData;
  if (options.body !== undefined && !isForm) headers.set('content-type', 'application/json');
  for (const [name, value] of Object.entries(options.headers ?? {})) {
    if (value === null) headers.delete(name);
    else headers.set(name, value);
  }
  const request = new Request(new URL(options.path ?? '/', 'http://elbowroom.test'), {
    method: options.method ?? 'GET',
    headers,
    body: options.body instanceof FormData ? options.body : JSON.stringify(options.body),
  });
  return handler(request, { params: Promise.resolve(options.params ?? {}) });
}

/** Another network address for every call, so that no test uses up the tries of another. */
export function someAddress(): string {
  return `2001:db8::${randomBytes(2).toString('hex')}:${randomBytes(2).toString('hex')}`;
}
