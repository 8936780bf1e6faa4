import type { TaskRow } from '@/lib/layout/judging/task-rows';
import type { VerdictBand } from '@/lib/layout/verdict-words';
import type { PointVerdict } from '@/lib/layout/verdicts';

export const BAND_WORDS: Record<VerdictBand, string> = {
  roomy: 'Roomy',
  fair: 'Fair',
  tight: 'Tight',
  pinned: 'Pinned',
  out: 'Out of reach',
};

/** What stands behind the name of a task that is not a point. */
export function kindOfTask(kind: TaskRow['kind']): string | null {
  return kind === 'path' ? 'a path' : kind === 'pattern' ? 'a pattern' : null;
}

/** "0.62 m/s, 0.22 above the 0.40 wanted."; null where no speed is wanted or the task is not reached. */
export function marginWords({ speedMmS, wantedSpeedMmS, marginMmS }: TaskRow): string | null {
  if (speedMmS === null || wantedSpeedMmS === null || marginMmS === null) return null;
  const metres = (mm: number): string => (Math.abs(mm) / 1000).toFixed(2);
  return `${metres(speedMmS)} m/s, ${metres(marginMmS)} ${marginMmS < 0 ? 'below' : 'above'} the ${metres(wantedSpeedMmS)} wanted.`;
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
