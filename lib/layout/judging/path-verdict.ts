import { branchOf, makeFollower, type Followed } from '@/lib/kinematics/motion/follow';
import { reach } from '@/lib/kinematics/reach';
import type { Transform } from '@/lib/kinematics/transforms';
import { limitShare } from '@/lib/kinematics/limits';
import { candidatesOf, worthOn, type Bench, type Candidate } from '../bench';
import type { Fixture, TaskPath } from '../items';
import { directionToBase, poseInBase } from '../robot-frame';
import { poseOnFloor, targetInBase } from '../task-points';
import { bandOf, pathSlowWords, shortfallWords, singularWords, type VerdictBand } from '../verdict-words';
import type { Assignment } from './assignment';
import { pathLine, pathStepMm, type PathLine, type Vector3 } from './path-line';

/** What a robot can do at one place of a path. */
export interface PathReading {
  readonly atMm: number;
  readonly positionMm: Vector3;
  /** Speed along the path with the tool held, mm/s. */
  readonly speedMmS: number;
  /** Less the wanted speed; null where none is wanted. */
  readonly marginMmS: number | null;
  readonly inverseConditionNumber: number;
  readonly bindingJoint: number | null;
}

/** How one robot does along one path. */
export interface RobotPathVerdict {
  readonly robotId: string;
  /** Followed from one end to the other without a jump of a joint. */
  readonly reached: boolean;
  /** Reached, in one branch throughout, and nowhere slower than wanted. */
  readonly met: boolean;
  readonly band: VerdictBand;
  readonly reason: string | null;
  readonly bindingJoint: number | null;
  /** Class of branch at the start; '' for chains without classes. */
  readonly branch: string;
  readonly branchKept: boolean;
  /** How far it gets, mm. */
  readonly followedMm: number;
  /** As far as it gets, from the start. */
  readonly readings: readonly PathReading[];
  readonly leastSpeedMmS: number | null;
  readonly speedMarginMmS: number | null;
  readonly leastInverseConditionNumber: number | null;
  readonly leastLimitShare: number | null;
  /** Where it is slowest: below the wanted speed, or within a tenth of the least; mm along the path. */
  readonly weakest: { readonly fromMm: number; readonly toMm: number; readonly positionMm: Vector3 } | null;
  /** Joint values at each reading, rad or m. */
  readonly postures: readonly ArrayLike<number>[];
}

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

/** A path where its fixture puts it: poses on the floor (m) and directions of travel. */
export interface FloorPath {
  readonly line: PathLine;
  readonly poses: readonly Transform[];
  readonly tangents: readonly Vector3[];
}

export function floorPath(fixture: Fixture, path: TaskPath): FloorPath {
  const line = pathLine(path.points, pathStepMm(path.points));
  const aim = poseOnFloor(fixture, { ...path, xMm: 0, yMm: 0, zMm: 0 });
  const turn = (fixture.angleDeg * Math.PI) / 180;
  const [cosine, sine] = [Math.cos(turn), Math.sin(turn)];
  const poses = line.points.map(({ positionMm: [x, y, z] }) => {
    const pose = aim.slice();
    pose[3] = (fixture.xMm + cosine * x - sine * y) / 1000;
    pose[7] = (fixture.yMm + sine * x + cosine * y) / 1000;
    pose[11] = z / 1000;
    return pose;
  });
  const tangents = line.points.map(({ tangent: [x, y, z] }): Vector3 => [
    cosine * x - sine * y,
    sine * x + cosine * y,
    z,
  ]);
  return { line, poses, tangents };
}

/** Every how many samples the branches are tried before the best one is followed closely. */
const COARSE = 5;
/** Branches tried at most: with a free roll the start has many. */
const MOST_STARTS = 8;

interface Run {
  readonly start: Candidate;
  readonly followed: Followed;
  readonly poses: readonly Transform[];
}

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
  const runs = starts.map((start): Run & { worth: number } => {
    const held = heldPoses(bench, start, inBase);
    const some = held.filter((_, k) => k % COARSE === 0 || k === held.length - 1);
    const followed = follow(start.posture, some);
    const indices = held.map((_, k) => k).filter((k) => k % COARSE === 0 || k === held.length - 1);
    return { start, poses: held, followed, worth: worthOfRun(bench, followed, indices, tangents, path.speedMmS) };
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

function speedAt({ solver, gauge }: Bench, posture: ArrayLike<number>, tangent: Vector3): number {
  gauge.read(solver.stand(posture));
  return gauge.speedAlong(gauge.linearRows.map((row) => tangent[row]));
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

function readRun(
  bench: Bench,
  path: TaskPath,
  { line, poses: onFloor }: FloorPath,
  tangents: readonly Vector3[],
  { start, poses }: Run,
): RobotPathVerdict {
  const { solver, gauge, robot, arm } = bench;
  const { postures, stop } = makeFollower(arm, solver)(start.posture, poses);
  let leastLimit = Infinity;
  let turnsAt: number | null = null;
  const branch = branchOf(solver, start.posture);
  const readings = postures.map((posture, k): PathReading => {
    const speedMmS = speedAt(bench, posture, tangents[k]) * 1000;
    const { inverseConditionNumber, bindingActuator } = gauge.reading;
    leastLimit = Math.min(leastLimit, limitShare(solver.chain, posture));
    if (turnsAt === null && branchOf(solver, posture) !== branch) turnsAt = line.points[k].atMm;
    return {
      atMm: line.points[k].atMm,
      positionMm: [onFloor[k][3] * 1000, onFloor[k][7] * 1000, onFloor[k][11] * 1000],
      speedMmS,
      marginMmS: path.speedMmS === null ? null : speedMmS - path.speedMmS,
      inverseConditionNumber,
      bindingJoint: bindingActuator < 0 ? null : bindingActuator + 1,
    };
  });
  if (readings.length === 0) return notFollowed(bench, 'No posture was found that starts it.', null);
  const slowest = readings.reduce((least, next) => (next.speedMmS < least.speedMmS ? next : least));
  const condition = Math.min(...readings.map((reading) => reading.inverseConditionNumber));
  const band = bandOf(condition > 0 ? 1 / condition : Infinity);
  const fast = path.speedMmS === null || slowest.speedMmS >= path.speedMmS;
  const branchKept = turnsAt === null;
  const followedMm = readings.at(-1)!.atMm;
  return {
    robotId: robot.id,
    reached: stop === null,
    met: stop === null && branchKept && fast,
    band: stop ? 'out' : band,
    reason: stop
      ? stopWords(bench, poses[postures.length], stop, line.points[postures.length].atMm)
      : turnsAt !== null
        ? `The branch is not kept: it passes a singular posture ${Math.round(turnsAt)} mm along.`
        : !fast
          ? pathSlowWords(slowest.bindingJoint, slowest.speedMmS, path.speedMmS!, slowest.atMm)
          : band === 'pinned'
            ? singularWords(1 / condition, slowest.bindingJoint)
            : null,
    bindingJoint: stop ? (stop.joint < 0 ? null : stop.joint + 1) : slowest.bindingJoint,
    branch,
    branchKept,
    followedMm,
    readings,
    leastSpeedMmS: slowest.speedMmS,
    speedMarginMmS: slowest.marginMmS,
    leastInverseConditionNumber: condition,
    leastLimitShare: leastLimit,
    weakest: weakestOf(readings, slowest, path.speedMmS),
    postures,
  };
}

/** The stretch about the slowest place. */
function weakestOf(
  readings: readonly PathReading[],
  slowest: PathReading,
  wantedMmS: number | null,
): RobotPathVerdict['weakest'] {
  const isSlow = wantedMmS !== null && slowest.speedMmS < wantedMmS;
  const limit = isSlow ? wantedMmS : slowest.speedMmS * 1.1;
  let from = readings.indexOf(slowest);
  let to = from;
  while (from > 0 && readings[from - 1].speedMmS <= limit) from -= 1;
  while (to + 1 < readings.length && readings[to + 1].speedMmS <= limit) to += 1;
  return { fromMm: readings[from].atMm, toMm: readings[to].atMm, positionMm: slowest.positionMm };
}

/** Why it went no farther: as for a point, where no branch reaches that place; else that this branch does not. */
function stopWords({ solver }: Bench, pose: Transform, stop: NonNullable<Followed['stop']>, atMm: number): string {
  const where = `${Math.round(atMm)} mm along`;
  const answer = reach(solver, {
    pose: [0, 4, 8].map((row) => Array.from(pose.subarray(row, row + 4))).concat([[0, 0, 0, 1]]),
  });
  const told = answer.reached ? { reason: stop.reason, joint: stop.joint, by: stop.by } : answer;
  const prismatic = told.joint >= 0 && solver.chain.prismatic[told.joint] === 1;
  if (answer.reached) {
    const joint = stop.joint < 0 ? 'a joint' : `joint ${stop.joint + 1}`;
    return `It stops ${where}: ${joint} is at its limit in the branch that it starts in.`;
  }
  const words = shortfallWords({
    reason: told.reason === 'out of reach' ? 'not found' : told.reason,
    joint: told.joint < 0 ? null : told.joint + 1,
    prismatic,
    by: told.by,
  });
  return `It stops ${where}: ${words[0].toLowerCase()}${words.slice(1)}`;
}

function notFollowed({ robot }: Bench, reason: string, bindingJoint: number | null): RobotPathVerdict {
  return {
    robotId: robot.id,
    reached: false,
    met: false,
    band: 'out',
    reason,
    bindingJoint,
    branch: '',
    branchKept: false,
    followedMm: 0,
    readings: [],
    leastSpeedMmS: null,
    speedMarginMmS: null,
    leastInverseConditionNumber: null,
    leastLimitShare: null,
    weakest: null,
    postures: [],
  };
}

/** One that meets the path before one that does not, then the one that gets farther, then the better conditioned. */
export function betterPath(best: RobotPathVerdict, next: RobotPathVerdict): RobotPathVerdict {
  if (next.met !== best.met) return next.met ? next : best;
  if (next.reached !== best.reached) return next.reached ? next : best;
  if (!next.reached) return next.followedMm > best.followedMm ? next : best;
  return (next.leastInverseConditionNumber ?? 0) > (best.leastInverseConditionNumber ?? 0) ? next : best;
}
