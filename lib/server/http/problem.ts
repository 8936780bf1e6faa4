import { STATUS_CODES } from 'node:http';
import { ConnectionError, UniqueConstraintError } from 'sequelize';
import type { Problem } from '@/lib/contracts/common';
import { AppError, conflict } from '../errors';

/** What the user is told about anything thrown. Of a fault of ours they learn no more than the number to quote. */
export function toAppError(error: unknown, requestId: string): AppError {
  if (error instanceof AppError) return error;
  // Two requests met: the one that came second can be sent again and will then find what the first one made.
  if (error instanceof UniqueConstraintError)
    return conflict('conflict', 'Somebody changed this at the same moment. Load it again and repeat your change.');
  if (error instanceof ConnectionError) {
    const detail = 'The database does not answer just now. Nothing was changed; try again in a minute.';
    return new AppError({ status: 503, code: 'unavailable', detail, headers: { 'retry-after': '30' } });
  }
  const detail = `Something went wrong on our side. Try again; if it stays, quote ${requestId} to your admin.`;
  return new AppError({ status: 500, code: 'internal', detail });
}

/** RFC 9457 problem document. */
export function problemResponse(error: AppError, requestId: string): Response {
  const problem: Problem = {
    type: 'about:blank',
    title: STATUS_CODES[error.status] ?? 'Error',
    status: error.status,
    code: error.code,
    detail: error.detail,
    requestId,
    ...(error.errors ? { errors: error.errors } : {}),
  };
  return new Response(JSON.stringify({ ...error.extra, ...problem }), {
    status: error.status,
    headers: { ...error.headers, 'content-type': 'application/problem+json' },
  });
}
