import type { FieldValues, Path, UseFormReturn } from 'react-hook-form';
import { ProblemError, sayError } from '@/lib/client/fetcher';

/**
 * Puts what the server refused beside the fields it is about; what belongs to no field of the form becomes the form's own
 * error (`root`). Nothing that was typed is touched.
 */
export function applyProblem<Values extends FieldValues, Context, Output>(
  form: UseFormReturn<Values, Context, Output>,
  error: unknown,
): void {
  const fields = error instanceof ProblemError ? (error.problem.errors ?? []) : [];
  const known = new Set(Object.keys(form.getValues()));
  const [first, ...others] = fields.filter(({ path }) => known.has(path.split('.')[0] ?? ''));
  if (!first) {
    form.setError('root', { message: sayError(error) });
    return;
  }
  form.setError(first.path as Path<Values>, { message: first.message }, { shouldFocus: true });
  for (const { path, message } of others) form.setError(path as Path<Values>, { message });
}
