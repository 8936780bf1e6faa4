import { ProblemError } from '@/lib/client/fetcher';
import type { DraftProblem } from '@/lib/editor/arm/check';
import { NO_REACH } from '@/lib/layout/arm-reach';

/** A chain that goes nowhere is refused by the server; the study finds it out beforehand. */
export function reachProblems(facts: { reachMm: number } | null): DraftProblem[] {
  return facts && Math.round(facts.reachMm) < 1 ? [{ paths: ['joints.0.a'], message: NO_REACH }] : [];
}

/** What the server refused, with the cells it is about. */
export function serverProblems(error: unknown): DraftProblem[] {
  const errors = error instanceof ProblemError ? (error.problem.errors ?? []) : [];
  return errors.map(({ path, message }) => ({ paths: [path.replace(/^definition\./, '')], message }));
}
