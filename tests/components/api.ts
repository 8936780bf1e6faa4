import { setupServer } from 'msw/node';
import { HttpResponse } from 'msw';
import { afterAll, afterEach, beforeAll } from 'vitest';

/** The server as component tests see it: each test says what it answers; an address nobody spoke of fails the test. */
export const api = setupServer();

export function withApi(): void {
  beforeAll(() => api.listen({ onUnhandledRequest: 'error' }));
  afterEach(() => api.resetHandlers());
  afterAll(() => api.close());
}

/** A refusal as the routes answer it (RFC 9457). */
export function problem(status: number, code: string, detail: string, errors?: { path: string; message: string }[]) {
  return HttpResponse.json(
    { type: 'about:blank', title: 'Refused', status, code, detail, requestId: 'test', errors },
    { status, headers: { 'Content-Type': 'application/problem+json' } },
  );
}
