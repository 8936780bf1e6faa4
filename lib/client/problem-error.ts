import { problemSchema, type Problem } from '@/lib/contracts/common';

/** A request that was refused or never arrived. `message` is fit to be shown. */
export class ProblemError extends Error {
  constructor(readonly problem: Problem) {
    super(problem.detail || problem.title);
    this.name = 'ProblemError';
  }

  get status(): number {
    return this.problem.status;
  }

  get code(): string {
    return this.problem.code;
  }

  /** What to say beside one field of the form; undefined where nothing is wrong with it. */
  fieldMessage(path: string): string | undefined {
    return this.problem.errors?.find((error) => error.path === path)?.message;
  }
}

const madeHere = (status: number, code: string, title: string, detail: string): ProblemError =>
  new ProblemError({ type: 'about:blank', title, status, code, detail, requestId: '' });

/** The server did not answer at all. */
export const unreachable = (): ProblemError =>
  madeHere(0, 'unreachable', 'No answer', 'The server did not answer. Check your connection and try again.');

/** The server answered something this version of the page cannot read. */
export const unreadable = (): ProblemError =>
  madeHere(0, 'unreadable', 'Unreadable answer', 'The answer could not be read. Reload the page and try again.');

/** The problem an answer carries, with its extra members kept; a plain one where the body is no problem document. */
export function problemFrom(status: number, body: unknown): ProblemError {
  const parsed = problemSchema.loose().safeParse(body);
  if (parsed.success) return new ProblemError(parsed.data);
  return madeHere(
    status,
    'failed',
    'Request failed',
    status === 413
      ? 'The file is too large for this server.'
      : `The server could not do that (status ${status}). Try again in a moment.`,
  );
}

/** Words for any thrown thing. */
export const sayError = (error: unknown): string =>
  error instanceof ProblemError ? error.message : 'Something went wrong on this page. Reload it and try again.';
