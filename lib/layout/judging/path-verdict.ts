import { makeFollower, type Followed } from '@/lib/kinematics/motion/follow';
import { reach } from '@/lib/kinematics/reach';
import type { Transform } from '@/lib/kinematics/transforms';
import { candidatesOf, worthOn, type Bench, type Candidate } from '../bench';
import type { TaskPath } from '../items';
import { directionToBase, poseInBase } from '../robot-frame';
import { targetInBase } from '../task-points';
import { shortfallWords } from '../verdict-words';
import type { Assignment } from './assignment';
import type { FloorPath } from './floor-path';
import type { Vector3 } from './path-line';
import { notFollowed, readRun, speedAt, type PathRun, type RobotPathVerdict } from './path-run';

export interface PathVerdict {
  readonly pathId: string;
  readonly pathName: string;
  readonly fixtureId: string;
  readonly fixtureName: string;
  readonly lengthMm: number;
  readonly wantedSpeedMmS: number | null;
  readonly assignment: Assignment;
  readonly best: RobotPathVerdict | null;
  readonly robots: readonly RobotPathVerdict[];
}

/** Every how many samples the branches are tried before the best one is followed closely. */
const COARSE = 5;
/** Branches tried at most: with a free roll the start has many. */
const MOST_STARTS = 8;

/** How a robot does along a path: every branch is tried, the best one told. With a free roll the tool keeps the roll that it starts with. */
export function judgePath(bench: Bench, path: TaskPath, floor: FloorPath): RobotPathVerdict {
  const { solver, robot } = bench;
  const inBase = floor.poses.map((pose) => poseInBase(robot, pose));
  if (inBase.length === 0) return notFollowed(bench, 'All corners lie on one spot.', null);
  const first = reach(solver, targetInBase({ rollDeg: path.rollDeg, pose: floor.poses[0] }, robot), worthOn(bench));
  const starts = bestStarts(candidatesOf(bench, first));
  if (starts.length === 0) {
    const joint = first.joint < 0 ? null : first.joint + 1;
    const prismatic = first.joint >= 0 && solver.chain.prismatic[first.joint] === 1;
    return notFollowed(bench, shortfallWords({ reason: first.reason, joint, prismatic, by: first.by }), joint);
  }
  const follow = makeFollower(bench.arm, solver);
  const tangents = floor.tangents.map((tangent) => directionToBase(robot, tangent));
  const runs = starts.map((start): PathRun & { worth: number } => {
    const held = heldPoses(bench, start, inBase);
    const some = held.filter((_, k) => k % COARSE === 0 || k === held.length - 1);
    const followed = follow(start.posture, some);
    const indices = held.map((_, k) => k).filter((k) => k % COARSE === 0 || k === held.length - 1);
    return { start, poses: held, worth: worthOfRun(bench, followed, indices, tangents, path.speedMmS) };
  });
  runs.sort((a, b) => b.worth - a.worth);
  let best: RobotPathVerdict | null = null;
  for (const run of runs) {
    const verdict = readRun(bench, path, floor, tangents, run);
    if (!best || betterPath(best, verdict) === verdict) best = verdict;
    // The quick look was right: nothing else will do better.
    if (best.reached) return best;
  }
  return best!;
}

/** One start a class of branch, the better conditioned; chains without classes keep all. */
function bestStarts(candidates: readonly Candidate[]): Candidate[] {
  const byBranch = new Map<string, Candidate>();
  candidates.forEach((candidate, index) => {
    const key = candidate.branch === '' ? String(index) : candidate.branch;
    const known = byBranch.get(key);
    if (!known || candidate.inverseConditionNumber > known.inverseConditionNumber) byBranch.set(key, candidate);
  });
  return [...byBranch.values()]
    .sort((a, b) => b.inverseConditionNumber - a.inverseConditionNumber)
    .slice(0, MOST_STARTS);
}

/** The path's poses with the tool turned as it stands at the start. */
function heldPoses({ solver }: Bench, { posture }: Candidate, poses: readonly Transform[]): Transform[] {
  solver.stand(posture);
  const turned = solver.stance.tool.slice();
  return poses.map((pose) => {
    const held = turned.slice();
    [held[3], held[7], held[11]] = [pose[3], pose[7], pose[11]];
    return held;
  });
}

/** How far it gets, and then how fast its slowest place is: capped at the wanted speed, beyond which it does not matter. */
function worthOfRun(
  bench: Bench,
  { postures, stop }: Followed,
  indices: readonly number[],
  tangents: readonly Vector3[],
  wantedMmS: number | null,
): number {
  if (stop) return postures.length / indices.length - 1;
  const least = postures.reduce(
    (slowest, posture, k) => Math.min(slowest, speedAt(bench, posture, tangents[indices[k]]) * 1000),
    Infinity,
  );
  return wantedMmS === null ? least : Math.min(least, 2 * wantedMmS);
}

/** One that meets the path before one that does not, then the one that gets farther, then the better conditioned. */
export function betterPath(best: RobotPathVerdict, next: RobotPathVerdict): RobotPathVerdict {
  if (next.met !== best.met) return next.met ? next : best;
  if (next.reached !== best.reached) return next.reached ? next : best;
  if (!next.reached) return next.followedMm > best.followedMm ? next : best;
  return (next.leastInverseConditionNumber ?? 0) > (best.leastInverseConditionNumber ?? 0) ? next : best;
}
