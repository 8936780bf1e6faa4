import { makeFollower } from '@/lib/kinematics/motion/follow';
import type { Bench } from '../bench';
import { shortfallWords } from '../verdict-words';
import { pathWay, statesAt, straightTo, type Layer, type MotionStep, type StraightMove } from './layers';
import type { ResolvedStep } from './resolve-steps';
import { runTime } from './straight-run';

/** Says what is the matter with a step. */
export type Name = (step: ResolvedStep, message: string) => void;

/** A layer for each step that can be reached; those that cannot are named and passed over. */
export function buildLayers(
  bench: Bench,
  resolved: readonly ResolvedStep[],
  name: Name,
): { moves: MotionStep[]; layers: Layer[] } {
  const moves: MotionStep[] = [];
  const layers: Layer[] = [];
  for (const step of resolved) {
    if (step.kind !== 'point' && step.kind !== 'path') continue;
    if (step.kind === 'path' && step.floor.poses.length === 0) {
      name(step, 'All corners of the path lie on one spot. Move one of them; the step is left out.');
      continue;
    }
    const layer = layerOf(bench, step, layers.at(-1) ?? null, name);
    if (!layer) continue;
    moves.push(step);
    layers.push(layer);
  }
  return { moves, layers };
}

function layerOf(bench: Bench, step: MotionStep, before: Layer | null, name: Name): Layer | null {
  const straight = step.step.motion === 'straight' && before ? straightLayer(bench, step, before, name) : null;
  const arrivals = straight ? straight.map(({ postures }) => postures[postures.length - 1]) : null;
  if (arrivals) {
    const layer = withRuns(bench, step, arrivals, straight);
    if (layer.arrivals.length > 0) return layer;
  }
  const pose = step.kind === 'point' ? step.pose : step.floor.poses[0];
  const { postures, answer } = statesAt(bench, pose, step.kind === 'point' ? step.rollDeg : step.path.rollDeg);
  if (postures.length === 0) {
    const prismatic = answer.joint >= 0 && bench.solver.chain.prismatic[answer.joint] === 1;
    const joint = answer.joint < 0 ? null : answer.joint + 1;
    name(step, `${shortfallWords({ reason: answer.reason, joint, prismatic, by: answer.by })} The step is left out.`);
    return null;
  }
  const layer = withRuns(bench, step, postures, null);
  if (layer.arrivals.length > 0) return layer;
  name(step, 'No branch follows the path to its end. The step is left out.');
  return null;
}

/** The straight ways into a step from each state before it; null, and named, where there is none. */
function straightLayer(bench: Bench, step: MotionStep, before: Layer, name: Name): StraightMove[] | null {
  const tries = before.ends.map((posture, index) => straightTo(bench, posture, index, step));
  const moves = tries.flatMap(({ move }) => move ?? []);
  if (moves.length > 0) return moves;
  const farthest = tries.reduce((best, next) =>
    next.followed.postures.length > best.followed.postures.length ? next : best,
  );
  const atMm = Math.round(
    1000 * farthest.way.atM[Math.min(farthest.followed.postures.length, farthest.way.atM.length - 1)],
  );
  const { stop } = farthest.followed;
  const why = stop && stop.joint >= 0 ? `joint ${stop.joint + 1} comes to its limit` : 'it leaves the reach of the arm';
  name(step, `The straight way cannot be kept: ${why} ${atMm} mm along. Timed as a joint move instead.`);
  return null;
}

/** Adds the run along a path; states that cannot follow it are dropped. */
function withRuns(
  bench: Bench,
  step: MotionStep,
  arrivals: readonly ArrayLike<number>[],
  straight: readonly StraightMove[] | null,
): Layer {
  if (step.kind === 'point') return { arrivals, ends: arrivals, runS: arrivals.map(() => 0), straightFrom: straight };
  const follow = makeFollower(bench.arm, bench.solver);
  const runs = arrivals.flatMap((arrival, index) => {
    const way = pathWay(bench, step, arrival);
    const { postures, stop } = follow(arrival, way.poses);
    if (stop) return [];
    const seconds = runTime(bench, way, postures, step.path.speedMmS ?? Infinity);
    return [{ arrival, end: postures[postures.length - 1], seconds, move: straight?.[index] ?? null }];
  });
  return {
    arrivals: runs.map(({ arrival }) => arrival),
    ends: runs.map(({ end }) => end),
    runS: runs.map(({ seconds }) => seconds),
    straightFrom: straight ? runs.map(({ move }) => move) : null,
  };
}
