import type { Reason } from '@/lib/kinematics/types';

/**
 * Bands of the condition number: up to 4, up to 10, up to 30, above. House values: practice calls 3.4 reasonable and 30
 * close to singular (common practice, no source).
 */
export const VERDICT_BANDS = ['roomy', 'fair', 'tight', 'pinned', 'out'] as const;
export type VerdictBand = (typeof VERDICT_BANDS)[number];

export const BAND_LIMITS = { roomy: 4, fair: 10, tight: 30 } as const;

/** `conditionNumber` ≥ 1, infinite in a singular posture. */
export function bandOf(conditionNumber: number): Exclude<VerdictBand, 'out'> {
  if (conditionNumber <= BAND_LIMITS.roomy) return 'roomy';
  if (conditionNumber <= BAND_LIMITS.fair) return 'fair';
  return conditionNumber <= BAND_LIMITS.tight ? 'tight' : 'pinned';
}

/** What stands in the way of a pose, as the kernel found it. */
export interface Shortfall {
  readonly reason: Reason;
  /** 1-based, null where no joint is to blame. */
  readonly joint: number | null;
  readonly prismatic: boolean;
  /** m out of reach, or rad or m beyond the joint's limit. */
  readonly by: number;
}

/** Why a point is not reached, as a short sentence. */
export function shortfallWords({ reason, joint, prismatic, by }: Shortfall): string {
  switch (reason) {
    case 'too far':
      return `Out of reach by ${millimetres(by)}.`;
    case 'too near':
      return `Too near the arm by ${millimetres(by)}.`;
    case 'joint limit':
      if (joint === null) return 'A joint is at its limit.';
      return `Joint ${joint} is at its limit: it would have to go ${prismatic ? millimetres(by) : degrees(by)} farther.`;
    case 'direction':
      return 'The arm cannot point its tool this way.';
    case 'obstacle':
      return 'An obstacle is in the way.';
    default:
      return 'No posture was found that reaches it.';
  }
}

/** Rounded up: a point that is out of reach is never out of reach by nothing. */
function millimetres(lengthM: number): string {
  return `${Math.max(1, Math.ceil(lengthM * 1000 - 1e-6))} mm`;
}

function degrees(angleRad: number): string {
  return `${Math.max(1, Math.ceil((angleRad * 180) / Math.PI - 1e-6))}°`;
}

export function slowWords(joint: number | null, sureMmS: number, wantedMmS: number): string {
  const binds = joint === null ? 'The arm' : `Joint ${joint}`;
  return `${binds} allows ${Math.floor(sureMmS)} mm/s in every direction; ${Math.ceil(wantedMmS)} mm/s are wanted.`;
}

export function pathSlowWords(joint: number | null, leastMmS: number, wantedMmS: number, atMm: number): string {
  const binds = joint === null ? 'The arm' : `Joint ${joint}`;
  return `${binds} allows ${Math.floor(leastMmS)} mm/s along the path ${Math.round(atMm)} mm along it; ${Math.ceil(wantedMmS)} mm/s are wanted.`;
}

/** For postures that are reached but poorly conditioned. */
export function singularWords(conditionNumber: number, joint: number | null): string {
  const who = joint === null ? 'One joint' : `Joint ${joint}`;
  const condition = conditionNumber > 9999 ? 'above 9,999' : String(Math.round(conditionNumber));
  return `Close to a singular posture (condition ${condition}): ${who.toLowerCase()} has to race for the tool to crawl.`;
}

/** A joint nearer to its limit than this is worth a word: 5°, or 20 mm of a slide. House values. */
const CLOSE_RAD = (5 * Math.PI) / 180;
const CLOSE_M = 0.02;

/** `distance`: rad, or m where the joint slides. Null where there is room enough. */
export function closeToLimitWords(joint: number, distance: number, slides: boolean): string | null {
  if (distance > (slides ? CLOSE_M : CLOSE_RAD)) return null;
  return `Joint ${joint} stands ${limitDistanceWords(distance, slides)} from its limit.`;
}

/** "12°" or "85 mm", rounded down: no more room is told than there is. */
export function limitDistanceWords(distance: number, slides: boolean): string {
  if (slides) return `${Math.max(0, Math.floor(distance * 1000 + 1e-6))} mm`;
  return `${Math.max(0, Math.floor((distance * 180) / Math.PI + 1e-6))}°`;
}

/** Parts of a branch's name that a planner would want to know of, and how it is said. */
const UNUSUAL: Readonly<Record<string, string>> = {
  'wrist flipped': 'Only with the wrist flipped.',
  'elbow down': 'Only with the elbow down.',
  'shoulder left': 'Only over its back (shoulder left).',
  'shoulder flipped': 'Only with the shoulder flipped.',
};

/**
 * What all branches that reach a point share where the arm has others: "Only with the wrist flipped." Branches are named part by part,
 * such as "shoulder right, elbow up, wrist plain"; the usual part of a pair needs no word.
 */
export function onlyWords(reaching: readonly string[], all: readonly string[]): string[] {
  if (reaching.length === 0) return [];
  return reaching[0].split(', ').flatMap((part, index) => {
    const words = UNUSUAL[part];
    const others = all.some((name) => name.split(', ')[index] !== part);
    const shared = reaching.every((name) => name.split(', ')[index] === part);
    return words && shared && others ? [words] : [];
  });
}
