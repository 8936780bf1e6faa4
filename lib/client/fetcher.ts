import type { z } from 'zod';
import { problemFrom, unreachable, unreadable } from './problem-error';

export { ProblemError, sayError } from './problem-error';

async function ask(url: string, init: RequestInit): Promise<unknown> {
  let response: Response;
  try {
    response = await fetch(url, { credentials: 'same-origin', ...init });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw unreachable();
  }
  const text = await response.text();
  let body: unknown = null;
  try {
    body = text ? JSON.parse(text) : null;
  } catch {
    if (response.ok) throw unreadable();
  }
  if (!response.ok) throw problemFrom(response.status, body);
  return body;
}

/** Checks an answer against its contract; throws ProblemError `unreadable` where it does not fit. */
export function readAnswer<Schema extends z.ZodType>(schema: Schema, body: unknown): z.infer<Schema> {
  const parsed = schema.safeParse(body);
  if (!parsed.success) {
    console.error('An answer does not fit its contract.', parsed.error.issues);
    throw unreadable();
  }
  return parsed.data;
}

/** GET as JSON. Throws ProblemError. */
export function fetcher(url: string): Promise<unknown>;
export function fetcher<Schema extends z.ZodType>(url: string, schema: Schema): Promise<z.infer<Schema>>;
export async function fetcher(url: string, schema?: z.ZodType): Promise<unknown> {
  const body = await ask(url, { headers: { Accept: 'application/json' } });
  return schema ? readAnswer(schema, body) : body;
}

export type Method = 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** Sends a change as JSON (FormData goes as it is) and gives back the answer, null for an empty one. Throws ProblemError. */
export function send(method: Method, url: string, body?: unknown): Promise<unknown>;
export function send<Schema extends z.ZodType>(
  method: Method,
  url: string,
  body: unknown,
  schema: Schema,
): Promise<z.infer<Schema>>;
export async function send(method: Method, url: string, body?: unknown, schema?: z.ZodType): Promise<unknown> {
  const isForm = body instanceof FormData;
  const answer = await ask(url, {
    method,
    headers: {
      Accept: 'application/json',
      ...(body === undefined || isForm ? {} : { 'Content-Type': 'application/json' }),
    },
    body: body === undefined ? undefined : isForm ? body : JSON.stringify(body),
  });
  return schema ? readAnswer(schema, answer) : answer;
}
