import type { VerdictBand } from '@/lib/layout/verdict-words';
import type { PointVerdict } from '@/lib/layout/verdicts';

export const BAND_WORDS: Record<VerdictBand, string> = {
  roomy: 'Roomy',
  fair: 'Fair',
  tight: 'Tight',
  pinned: 'Pinned',
  out: 'Out of reach',
};

/** Not reached before too slow before badly conditioned; the better conditioned the later. */
export function worstFirst(one: PointVerdict, other: PointVerdict): number {
  return worth(one) - worth(other);
}

function worth({ best }: PointVerdict): number {
  if (!best) return -3;
  if (!best.reached) return -2;
  const conditioning = best.posture?.inverseConditionNumber ?? 0;
  return best.met ? conditioning : conditioning - 1;
}

/** "3 task points, all met", and whether that is trouble. */
export function fixtureWords(
  verdicts: readonly PointVerdict[],
  pointCount: number,
): { words: string; isTrouble: boolean } {
  const counted = `${pointCount} task ${pointCount === 1 ? 'point' : 'points'}`;
  if (pointCount === 0) return { words: 'no task points', isTrouble: false };
  if (verdicts.every(({ best }) => best === null)) return { words: counted, isTrouble: false };
  const out = verdicts.filter(({ best }) => best && !best.reached).length;
  if (out > 0) return { words: `${counted}, ${out} out of reach`, isTrouble: true };
  const slow = verdicts.filter(({ best }) => best && !best.met).length;
  if (slow > 0) return { words: `${counted}, ${slow} too slow`, isTrouble: true };
  const pinned = verdicts.filter(({ best }) => best?.band === 'pinned').length;
  if (pinned > 0) return { words: `${counted}, ${pinned} pinned`, isTrouble: true };
  const tight = verdicts.filter(({ best }) => best?.band === 'tight').length;
  return { words: tight > 0 ? `${counted}, ${tight} tight` : `${counted}, all met`, isTrouble: false };
}
