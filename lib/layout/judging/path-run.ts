import { branchOf, makeFollower, type Followed } from '@/lib/kinematics/motion/follow';
import { limitShare } from '@/lib/kinematics/limits';
import { reach } from '@/lib/kinematics/reach';
import type { Transform } from '@/lib/kinematics/transforms';
import type { Bench, Candidate } from '../bench';
import type { TaskPath } from '../items';
import { bandOf, pathSlowWords, shortfallWords, singularWords, type VerdictBand } from '../verdict-words';
import type { FloorPath } from './floor-path';
import type { Vector3 } from './path-line';

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

/** A path begun in one posture: its poses with the tool turned as it stands there, in the base frame. */
export interface PathRun {
  readonly start: Candidate;
  readonly poses: readonly Transform[];
}

/** Speed along the path with the tool held, m/s. */
export function speedAt({ solver, gauge }: Bench, posture: ArrayLike<number>, tangent: Vector3): number {
  gauge.read(solver.stand(posture));
  return gauge.speedAlong(gauge.linearRows.map((row) => tangent[row]));
}

/** What a robot makes of the path from one start, read at every sample. */
export function readRun(
  bench: Bench,
  path: TaskPath,
  { line, poses: onFloor }: FloorPath,
  tangents: readonly Vector3[],
  { start, poses }: PathRun,
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

/** The verdict on a path that is not even begun. */
export function notFollowed({ robot }: Bench, reason: string, bindingJoint: number | null): RobotPathVerdict {
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
