import { compileChain, forward, makeStance, type Chain } from '@/lib/kinematics/chain';
import type { Arm } from '@/lib/kinematics/types';

export type Posture = Float64Array;

/** How finely the best posture is searched: shares of a joint's range that count as no step. */
const DONE = 1e-7;
const SAMPLES = 12;
const ROUNDS = 40;
/** Of all starts the highest are followed: a twelve-joint chain has to be answered while somebody types. */
const CLIMBED = 3;

/**
 * The greatest value of a figure of the posture (actuator values, rad or m) inside the limits, by line searches from the middle and
 * from corners of the joints' ranges. The figure has to be smooth.
 */
export function farthest(arm: Arm, figure: (posture: Posture) => number): number {
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
