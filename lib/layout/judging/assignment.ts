import type { Robot } from '../items';

/** How it was settled which robot's verdict counts. */
export type Assignment = 'best robot' | 'by hand' | 'robot gone';

/**
 * The robot whose verdict counts: the one chosen by hand, else the best. Where the chosen one is no longer on the sheet the best counts, and
 * it is said so.
 */
export function assigned<T extends { readonly robotId: string }>(
  robotId: string | null,
  verdicts: readonly T[],
  better: (best: T, next: T) => T,
): { readonly best: T | null; readonly assignment: Assignment } {
  const chosen = robotId === null ? undefined : verdicts.find((verdict) => verdict.robotId === robotId);
  if (chosen) return { best: chosen, assignment: 'by hand' };
  const best = verdicts.length === 0 ? null : verdicts.reduce(better);
  return { best, assignment: robotId === null ? 'best robot' : 'robot gone' };
}

/** Everything about where a robot stands that its verdicts depend on, beside its bench. */
export const standOf = ({ xMm, yMm, angleDeg, riserMm }: Robot): readonly number[] => [xMm, yMm, angleDeg, riserMm];
