import { branchOf, type Followed } from '@/lib/kinematics/motion/follow';
import { timePath } from '@/lib/kinematics/motion/path-time';
import { straightPoses, turnBetween } from '@/lib/kinematics/motion/poses';
import { rolled } from '@/lib/kinematics/target';
import { identityTransform, rotationDistance, type Transform } from '@/lib/kinematics/transforms';
import type { Bench } from '../bench';
import { BAND_LIMITS } from '../verdict-words';

/** Poses that the tool goes through, in the base frame (m), and where it comes to rest among them. */
export interface Way {
  readonly poses: readonly Transform[];
  /** Length up to each pose, m. */
  readonly atM: readonly number[];
  /** Indices of poses at rest, the two ends among them. */
  readonly rests: readonly number[];
}

/** Samples of a straight move: a sixtieth of its length, 2 to 20 mm. */
const MOST_SAMPLES = 60;
const LEAST_STEP_M = 0.002;
const MOST_STEP_M = 0.02;

/**
 * Straight from one pose to another by way of points at which the tool comes to rest; it turns evenly over the whole length.
 */
export function straightWay(from: Transform, to: Transform, via: readonly (readonly [number, number, number])[]): Way {
  const stops: Transform[] = [from];
  const lengths = [0];
  const corners = [...via, [to[3], to[7], to[11]] as const];
  let before: readonly [number, number, number] = [from[3], from[7], from[11]];
  for (const corner of corners) {
    lengths.push(lengths[lengths.length - 1] + Math.hypot(...corner.map((value, axis) => value - before[axis])));
    before = corner;
  }
  const whole = lengths[lengths.length - 1];
  corners.forEach((corner, index) => {
    const share = whole > 0 ? lengths[index + 1] / whole : 1;
    const pose = turnBetween(from, to, share, identityTransform());
    [pose[3], pose[7], pose[11]] = corner;
    stops.push(pose);
  });
  const step = Math.min(MOST_STEP_M, Math.max(LEAST_STEP_M, whole / MOST_SAMPLES));
  const poses: Transform[] = [];
  const atM: number[] = [];
  const rests = [0];
  for (let leg = 0; leg + 1 < stops.length; leg++) {
    const offset = atM.length === 0 ? 0 : atM[atM.length - 1];
    const line = straightPoses(stops[leg], stops[leg + 1], step, rotationDistance(stops[leg], stops[leg + 1]));
    line.poses.forEach((pose, k) => {
      if (k === 0 && leg > 0) return;
      poses.push(pose);
      atM.push(offset + line.atM[k]);
    });
    rests.push(poses.length - 1);
  }
  return { poses, atM, rests };
}

/** A pose with a free roll, rolled so that it turns least from where the tool stands. */
export function leastRolled(from: Transform, to: Transform): Transform {
  const along = (column: 0 | 1, other: 0 | 1): number =>
    from[column] * to[other] + from[4 + column] * to[4 + other] + from[8 + column] * to[8 + other];
  return rolled(to, Math.atan2(along(0, 1) - along(1, 0), along(0, 0) + along(1, 1)), identityTransform());
}

/** Where a joint has to race because the way passes close to a singular posture; mm along the way. */
export interface Crossing {
  readonly fromMm: number;
  readonly toMm: number;
  readonly joint: number | null;
  /** Least speed that the joints allow there. */
  readonly speedMmS: number;
  /** The class of branch changes there. */
  readonly changesBranch: boolean;
}

/** Time (s) from rest to rest along followed postures, at most `upperMmS`. */
export function runTime({ solver }: Bench, way: Way, postures: Followed['postures'], upperMmS: number): number {
  let seconds = 0;
  for (let leg = 0; leg + 1 < way.rests.length; leg++)
    seconds += timePath(solver.chain, samplesOf(way, postures, leg), upperMmS / 1000).seconds;
  return seconds;
}

const samplesOf = (way: Way, postures: Followed['postures'], leg: number) => {
  const [from, to] = [way.rests[leg], way.rests[leg + 1]];
  return postures.slice(from, to + 1).map((posture, k) => ({ atM: way.atM[from + k], posture }));
};

export interface RunReading {
  readonly lengthMm: number;
  /** Least speed that the joints allow on the way, and the joint that bounds it there, from 1. */
  readonly leastSpeedMmS: number;
  readonly slowestJoint: number | null;
  readonly crossings: readonly Crossing[];
}

/** What there is to tell of a run that was chosen. */
export function readRun(bench: Bench, way: Way, postures: Followed['postures']): RunReading {
  const { solver, gauge } = bench;
  const whole = { ...way, rests: [0, way.poses.length - 1] };
  const { allowed, binding } = timePath(solver.chain, samplesOf(whole, postures, 0), Infinity);
  let least = 0;
  allowed.forEach((speed, k) => {
    if (speed < allowed[least]) least = k;
  });
  const branches = postures.map((posture) => branchOf(solver, posture));
  const isClose = postures.map(
    (posture) => gauge.readGains(solver.stand(posture)).inverseConditionNumber < 1 / BAND_LIMITS.tight,
  );
  const crossings: Crossing[] = [];
  const marked = postures.map((_, k) => isClose[k] || (k > 0 && branches[k] !== branches[k - 1]));
  for (let from = 0; from < marked.length; from++) {
    if (!marked[from]) continue;
    let to = from;
    while (to + 1 < marked.length && marked[to + 1]) to += 1;
    let slowest = from;
    for (let k = from; k <= to; k++) if (allowed[k] < allowed[slowest]) slowest = k;
    crossings.push({
      fromMm: way.atM[from] * 1000,
      toMm: way.atM[to] * 1000,
      joint: binding[slowest] < 0 ? null : binding[slowest] + 1,
      speedMmS: allowed[slowest] * 1000,
      changesBranch: branches[Math.max(0, from - 1)] !== branches[to],
    });
    from = to;
  }
  return {
    lengthMm: way.atM[way.atM.length - 1] * 1000,
    leastSpeedMmS: allowed[least] * 1000,
    slowestJoint: binding[least] < 0 ? null : binding[least] + 1,
    crossings,
  };
}
