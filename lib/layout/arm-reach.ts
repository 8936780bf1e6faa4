import { compileChain, forward, makeStance, type Chain } from '@/lib/kinematics/chain';
import { along, cross, dot, length, minus, nearestOnFirst, type Triple } from '@/lib/kinematics/inverse/lines';
import type { Arm } from '@/lib/kinematics/types';

/** What to say of an arm without any. */
export const NO_REACH =
  'The tool of this chain never leaves its first axis: an arm needs a link length (a) or an offset (d).';

/** How well the last metres are searched: shares of a joint's range that count as no step. */
const DONE = 1e-7;
const SAMPLES = 12;
const ROUNDS = 40;
/** Of all starts the highest are followed: a twelve-joint chain has to be answered while somebody types. */
const CLIMBED = 3;

/**
 * How far an arm reaches (mm), as the trade states it: the greatest distance from the first axis that the wrist centre can take
 * inside the limits, or the tool point of an arm whose last three axes do not meet. Where the first joint slides, the
 * distance is taken from the upright line through the base instead, since the first axis lies along the travel.
 * Found by line searches over forward kinematics, from the middle and from corners of the joints' ranges.
 */
export function armReachMm(arm: Arm): number {
  return 1000 * Math.sqrt(Math.max(0, farthest(arm, squareFromFirstAxis(arm))));
}

/** The highest and the lowest that the same point comes, mm above the frame that the base is given in. */
export function armHeightsMm(arm: Arm): { topMm: number; bottomMm: number } {
  const point = reachPoint(compileChain(arm));
  return {
    topMm: 1000 * farthest(arm, (posture) => point(posture)[2]),
    bottomMm: -1000 * farthest(arm, (posture) => -point(posture)[2]),
  };
}

type Posture = Float64Array;

function squareFromFirstAxis(arm: Arm): (posture: Posture) => number {
  const chain = compileChain(arm);
  const point = reachPoint(chain);
  const { axes, origins } = forward(chain, new Float64Array(chain.actuators), makeStance(chain));
  const slides = chain.prismatic[0] === 1;
  const origin: Triple = slides ? [chain.base[3], chain.base[7], chain.base[11]] : [origins[0], origins[1], origins[2]];
  const axis: Triple = slides ? [chain.base[2], chain.base[6], chain.base[10]] : [axes[0], axes[1], axes[2]];
  return (posture) => {
    const aside = cross(minus(point(posture), origin), axis);
    return dot(aside, aside);
  };
}

/** Lengths (m) below which two axes count as meeting. */
const MEETING = 1e-6;

/** The wrist centre of a posture, or its tool point where the last three axes do not turn about one point. */
function reachPoint(chain: Chain): (posture: Posture) => Triple {
  const stance = makeStance(chain);
  const n = chain.joints;
  const wrist = wristOffset(chain);
  return (posture) => {
    const { axes, origins, tool } = forward(chain, posture, stance);
    if (wrist === null) return [tool[3], tool[7], tool[11]];
    const j = 3 * (n - 2);
    return along([origins[j], origins[j + 1], origins[j + 2]], [axes[j], axes[j + 1], axes[j + 2]], wrist);
  };
}

/** How far along the last but one axis the last three meet (m), or null. It is the same in every posture. */
function wristOffset(chain: Chain): number | null {
  const n = chain.joints;
  if (n < 4 || chain.prismatic.subarray(n - 3).includes(1)) return null;
  const { axes, origins } = forward(chain, new Float64Array(chain.actuators), makeStance(chain));
  const line = (joint: number): [Triple, Triple] => [
    [origins[3 * joint], origins[3 * joint + 1], origins[3 * joint + 2]],
    [axes[3 * joint], axes[3 * joint + 1], axes[3 * joint + 2]],
  ];
  const [before, middle, last] = [line(n - 3), line(n - 2), line(n - 1)];
  const meetings = [before, last].map((other) => {
    const onMiddle = nearestOnFirst(...middle, ...other);
    if (!onMiddle) return null;
    const aside = length(cross(minus(onMiddle, other[0]), other[1]));
    return aside < MEETING ? dot(minus(onMiddle, middle[0]), middle[1]) : null;
  });
  const [first, second] = meetings;
  if (first === null || second === null || Math.abs(first - second) > MEETING) return null;
  return first;
}

/** The greatest value of a figure of the posture inside the limits. */
function farthest(arm: Arm, figure: (posture: Posture) => number): number {
  const chain = compileChain(arm);
  const inside = insideLimits(chain);
  const value = (posture: Posture): number => (inside(posture) ? figure(posture) : -Infinity);
  const moving = movingActuators(chain, figure);
  const likely = Array.from(starts(chain, moving), (posture) => ({ posture, height: value(posture) }))
    .sort((one, other) => other.height - one.height)
    .slice(0, CLIMBED);
  const best = likely.reduce((high, { posture }) => Math.max(high, climb(chain, posture, moving, value)), -Infinity);
  // A coupling may leave no start inside the limits of its joints; the rest posture then says what there is.
  return best === -Infinity ? figure(middleOf(chain)) : best;
}

const middleOf = (chain: Chain): Posture => chain.min.map((min, k) => (min + chain.max[k]) / 2);

/** Under a coupling the joints have limits of their own. */
function insideLimits(chain: Chain): (posture: Posture) => boolean {
  if (!chain.coupling) return () => true;
  const stance = makeStance(chain);
  return (posture) => {
    const { joints } = forward(chain, posture, stance);
    return joints.every((q, i) => q >= chain.jointMin[i] - DONE && q <= chain.jointMax[i] + DONE);
  };
}

/** Those that change the figure at all: turning the first axis or the wrist does not. */
function movingActuators(chain: Chain, figure: (posture: Posture) => number): number[] {
  const probes = [0.31, 0.57, 0.83].map((share) => chain.min.map((min, k) => min + share * (chain.max[k] - min)));
  return Array.from(chain.min.keys()).filter((k) =>
    probes.some((probe) => {
      const moved = probe.slice();
      moved[k] = chain.min[k] + 0.13 * (chain.max[k] - chain.min[k]);
      return Math.abs(figure(moved) - figure(probe)) > 1e-12;
    }),
  );
}

/** The middle, then the corners of the ranges of up to four joints: enough to come round any fold of a serial chain. */
function* starts(chain: Chain, moving: readonly number[]): Generator<Posture> {
  const shares = [0.5, 0.02, 0.98];
  const spread = moving.slice(0, 4);
  for (let code = 0; code < 3 ** spread.length; code++) {
    const posture = middleOf(chain);
    spread.forEach((k, place) => {
      const share = shares[Math.floor(code / 3 ** place) % 3];
      posture[k] = chain.min[k] + share * (chain.max[k] - chain.min[k]);
    });
    yield posture;
  }
}

/** Line searches along each joint, then along each sum and difference of two, until nothing is won any more. */
function climb(chain: Chain, start: Posture, moving: readonly number[], value: (posture: Posture) => number): number {
  const posture = start.slice();
  let best = value(posture);
  const ways = waysOf(chain, moving);
  for (let round = 0; round < ROUNDS; round++) {
    const before = best;
    for (const way of ways) best = searchAlong(chain, posture, way, best, value);
    if (best - before < 1e-12) break;
  }
  return best;
}

/** Steps as shares of the joints' ranges. */
function waysOf(chain: Chain, moving: readonly number[]): Posture[] {
  const way = (parts: readonly (readonly [number, number])[]): Posture => {
    const step = new Float64Array(chain.actuators);
    for (const [k, sign] of parts) step[k] = sign * (chain.max[k] - chain.min[k]);
    return step;
  };
  const single = moving.map((k) => way([[k, 1]]));
  const pairs = moving.flatMap((k, place) =>
    moving.slice(place + 1).flatMap((other) => [
      way([
        [k, 1],
        [other, 1],
      ]),
      way([
        [k, 1],
        [other, -1],
      ]),
    ]),
  );
  return [...single, ...pairs];
}

/** Moves `posture` to the best spot on a line through it within the limits; samples first, then narrows round the best. */
function searchAlong(
  chain: Chain,
  posture: Posture,
  way: Posture,
  current: number,
  value: (posture: Posture) => number,
): number {
  let low = -Infinity;
  let high = Infinity;
  for (let k = 0; k < way.length; k++) {
    if (way[k] === 0) continue;
    const ends = [(chain.min[k] - posture[k]) / way[k], (chain.max[k] - posture[k]) / way[k]];
    low = Math.max(low, Math.min(...ends));
    high = Math.min(high, Math.max(...ends));
  }
  if (!(high - low > DONE)) return current;
  const trial = posture.slice();
  const at = (t: number): number => {
    for (let k = 0; k < way.length; k++)
      trial[k] = Math.min(chain.max[k], Math.max(chain.min[k], posture[k] + t * way[k]));
    return value(trial);
  };
  let best = current;
  let bestAt = 0;
  let step = (high - low) / SAMPLES;
  for (let sample = 0; sample <= SAMPLES; sample++) {
    const t = sample === SAMPLES ? high : low + sample * step;
    const reached = at(t);
    if (reached > best) [best, bestAt] = [reached, t];
  }
  while (step > DONE) {
    step /= 2;
    for (const t of [bestAt - step, bestAt + step]) {
      if (t < low || t > high) continue;
      const reached = at(t);
      if (reached > best) [best, bestAt] = [reached, t];
    }
  }
  at(bestAt);
  posture.set(trial);
  return best;
}
