import type { ReachAnswer, ReachingPosture, Score } from '../reach';
import type { Reason } from '../types';
import type { Family } from './closed-form';

/** Halvings of the sample spacing that narrow a place of the family in: to a millionth of it for a way in, less for a best value. */
const ENTRY_HALVINGS = 20;
const BEST_HALVINGS = 8;

/** Which refusal comes nearest to an answer, so that it is the one to tell. */
const NEARNESS: readonly Reason[] = [
  'joint limit',
  'direction',
  'too near',
  'too far',
  'not found',
  'obstacle',
  'reached',
];

export function isNearer(one: ReachAnswer, other: ReachAnswer): boolean {
  if (one.reached !== other.reached) return one.reached;
  const order = NEARNESS.indexOf(one.reason) - NEARNESS.indexOf(other.reason);
  return order < 0 || (order === 0 && one.by < other.by);
}

interface Place {
  readonly parameter: number;
  readonly answer: ReachAnswer;
}

/**
 * Postures along the family of a redundant chain: at even samples; where none of them is inside the limits, the sample that misses by
 * least is narrowed in; and of each class of branch the posture worth most is refined. `look`: the answer at one place.
 */
export function reachFamily(family: Family, look: (parameter: number) => ReachAnswer, score: Score): ReachAnswer {
  const stride = strideOf(family);
  const places = Array.from({ length: family.samples }, (_, k): Place => {
    const parameter = family.from + k * stride;
    return { parameter, answer: look(parameter) };
  });
  const within = withinFamily(family);
  if (!places.some(({ answer }) => answer.reached)) {
    const entry = narrow(places, stride, within, look);
    if (!entry.answer.reached) return entry.answer;
    places.push(entry);
  }
  const postures = places.flatMap(({ answer }) => answer.postures);
  for (const best of bestPlaces(places, score)) {
    const refined = refine(best, stride, within, look, score);
    if (refined) postures.push(refined);
  }
  return { reached: true, reason: 'reached', joint: -1, by: 0, postures };
}

/** Distance of two samples: an open family has one at either end. */
export const strideOf = ({ from, to, closed, samples }: Family): number =>
  (to - from) / (closed ? samples : samples - 1);

/** Keeps a parameter inside the family; round a closed one it may go on, as the closed forms only take its sine and cosine. */
export const withinFamily =
  ({ from, to, closed }: Family) =>
  (parameter: number): number =>
    closed ? parameter : Math.min(to, Math.max(from, parameter));

function narrow(
  places: readonly Place[],
  stride: number,
  within: (parameter: number) => number,
  look: (parameter: number) => ReachAnswer,
): Place {
  let best = places.reduce((least, place) => (isNearer(place.answer, least.answer) ? place : least));
  for (let halving = 0, step = stride / 2; halving < ENTRY_HALVINGS && !best.answer.reached; halving++, step /= 2)
    for (const parameter of [within(best.parameter - step), within(best.parameter + step)]) {
      const answer = look(parameter);
      if (isNearer(answer, best.answer)) best = { parameter, answer };
    }
  return best;
}

interface BestPlace {
  parameter: number;
  worth: number;
  readonly branch: string;
}

function bestPlaces(places: readonly Place[], score: Score): BestPlace[] {
  const best = new Map<string, BestPlace>();
  for (const { parameter, answer } of places)
    for (const { posture, branch } of answer.postures) {
      const worth = score(posture);
      const known = best.get(branch);
      if (!known || worth > known.worth) best.set(branch, { parameter, worth, branch });
    }
  return [...best.values()];
}

/** The posture worth more than the sample that it started from, or null. */
function refine(
  { parameter, worth, branch }: BestPlace,
  stride: number,
  within: (parameter: number) => number,
  look: (parameter: number) => ReachAnswer,
  score: Score,
): ReachingPosture | null {
  let found: ReachingPosture | null = null;
  for (let halving = 0, step = stride / 2; halving < BEST_HALVINGS; halving++, step /= 2) {
    const centre = parameter;
    for (const trial of [within(centre - step), within(centre + step)])
      for (const candidate of look(trial).postures) {
        if (candidate.branch !== branch) continue;
        const value = score(candidate.posture);
        if (value <= worth) continue;
        worth = value;
        parameter = trial;
        found = candidate;
      }
  }
  return found;
}
