/** One refused field: path into the request, and what to do about it. */
export interface FieldError {
  path: string;
  message: string;
}

interface AppErrorOptions {
  status: number;
  /** Stable, for programs: `stale_item`, `not_found`, … */
  code: string;
  /** Says what is wrong and what to do, in plain words. */
  detail: string;
  errors?: FieldError[];
  /** Members added to the problem document, such as `conflicts`. */
  extra?: object;
  headers?: Record<string, string>;
}

/** A refusal that the user is told about. Everything else that is thrown is a fault of ours and answers 500. */
export class AppError extends Error {
  readonly status: number;
  readonly code: string;
  readonly detail: string;
  readonly errors?: FieldError[];
  readonly extra?: object;
  readonly headers?: Record<string, string>;

  constructor(options: AppErrorOptions) {
    super(`${options.code}: ${options.detail}`);
    this.name = 'AppError';
    this.status = options.status;
    this.code = options.code;
    this.detail = options.detail;
    this.errors = options.errors;
    this.extra = options.extra;
    this.headers = options.headers;
  }
}

/** 404. Also the answer for what belongs to somebody else: whether it exists is theirs to know. `what` is a noun: "project". */
export function notFound(what: string): AppError {
  const detail = `This ${what} does not exist, or it is not shared with you. Check the address, or ask the person who sent it.`;
  return new AppError({ status: 404, code: 'not_found', detail });
}

export function unauthenticated(): AppError {
  return new AppError({ status: 401, code: 'signed_out', detail: 'You are signed out. Sign in and try again.' });
}

export function forbidden(detail = 'Your role does not allow this. Ask an admin of your organisation.'): AppError {
  return new AppError({ status: 403, code: 'forbidden', detail });
}

/** 409. `extra` joins the problem document, so that the client can show what stands in the way. */
export function conflict(code: string, detail: string, extra?: object): AppError {
  return new AppError({ status: 409, code, detail, extra });
}

/** 422 for one field; `path` as in the request body: "name", "items.0.xMm". */
export function invalid(path: string, message: string): AppError {
  return invalidFields([{ path, message }]);
}

export function invalidFields(errors: FieldError[]): AppError {
  const detail = errors.length === 1 ? errors[0].message : 'Some fields need another value.';
  return new AppError({ status: 422, code: 'invalid', detail, errors });
}

/** 413. `detail` names the limit. */
export function tooLarge(detail: string): AppError {
  return new AppError({ status: 413, code: 'too_large', detail });
}

/** 429 with Retry-After. */
export function tooManyRequests(detail: string, retryAfterS: number): AppError {
  const headers = { 'retry-after': String(Math.max(1, Math.ceil(retryAfterS))) };
  return new AppError({ status: 429, code: 'too_many_requests', detail, headers });
}

/** 404 for a link out of a mail; says the same for a wrong, an old and a used one. */
export function linkNotValid(): AppError {
  const detail = 'This link is not valid any more: it was used, has expired or was withdrawn. Ask for a new one.';
  return new AppError({ status: 404, code: 'link_not_valid', detail });
}
