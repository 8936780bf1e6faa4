import { makeFollower, type Followed } from '@/lib/kinematics/motion/follow';
import { jointMove } from '@/lib/kinematics/motion/profile';
import { reach, type ReachAnswer } from '@/lib/kinematics/reach';
import type { Transform } from '@/lib/kinematics/transforms';
import { candidatesOf, worthOn, type Bench } from '../bench';
import type { TaskPoint } from '../items';
import { floorToBase, poseInBase } from '../robot-frame';
import { targetInBase } from '../task-points';
import { leastRolled, runTime, straightWay, type Way } from './straight-run';
import type { ResolvedStep } from './resolve-steps';

/** Postures kept a step: enough for every branch of a six-axis arm with its whole turns. */
const MOST_STATES = 64;

/** The ways in which a robot can stand at the end of a step, and what each costs from each way of the step before. */
export interface Layer {
  /** Where it comes to, and where it stands when the step is done: the two differ along a path. */
  readonly arrivals: readonly ArrayLike<number>[];
  readonly ends: readonly ArrayLike<number>[];
  /** Time spent on the path itself, s; 0 for points. */
  readonly runS: readonly number[];
  /** A straight way exists only from the state that it was followed from: index by state; null for joint moves. */
  readonly straightFrom: readonly (StraightMove | null)[] | null;
}

export interface StraightMove {
  readonly before: number;
  readonly seconds: number;
  readonly way: Way;
  readonly postures: Followed['postures'];
}

export type MotionStep = Extract<ResolvedStep, { kind: 'point' | 'path' }>;

/** Postures at a pose of the floor frame: all that the limits allow where the roll is given, of the endless ones the best a branch. */
export function statesAt(
  bench: Bench,
  pose: Transform,
  rollDeg: TaskPoint['rollDeg'],
): { postures: number[][]; answer: ReachAnswer } {
  const answer = reach(bench.solver, targetInBase({ rollDeg, pose }, bench.robot), worthOn(bench));
  if (answer.postures.length <= MOST_STATES) return { postures: answer.postures.map(({ posture }) => posture), answer };
  const best = candidatesOf(bench, answer).sort((a, b) => b.inverseConditionNumber - a.inverseConditionNumber);
  const perBranch = new Map<string, number>();
  const kept = best.filter(({ branch }) => {
    const count = perBranch.get(branch) ?? 0;
    perBranch.set(branch, count + 1);
    return count < 3;
  });
  return { postures: kept.slice(0, MOST_STATES).map(({ posture }) => posture), answer };
}

/** Poses of a step's path in the base frame, the tool turned as it stands at the start. */
export function pathWay(bench: Bench, { floor }: Extract<MotionStep, { kind: 'path' }>, start: ArrayLike<number>): Way {
  bench.solver.stand(start);
  const turned = bench.solver.stance.tool.slice();
  const poses = floor.poses.map((onFloor) => {
    const inBase = poseInBase(bench.robot, onFloor);
    const held = turned.slice();
    [held[3], held[7], held[11]] = [inBase[3], inBase[7], inBase[11]];
    return held;
  });
  return { poses, atM: floor.line.points.map(({ atMm }) => atMm / 1000), rests: floor.line.rests };
}

/** Time of a joint move between two postures, s. */
export const jointSeconds = ({ solver }: Bench, from: ArrayLike<number>, to: ArrayLike<number>): number =>
  jointMove(solver.chain, from, to).seconds;

/** The straight way from a posture to a step, followed; null where the arm cannot keep to it. */
export function straightTo(
  bench: Bench,
  from: ArrayLike<number>,
  before: number,
  step: MotionStep,
): { readonly move: StraightMove | null; readonly followed: Followed; readonly way: Way } {
  const { solver, robot } = bench;
  solver.stand(from);
  const start = solver.stance.tool.slice();
  const rollDeg = step.kind === 'point' ? step.rollDeg : step.path.rollDeg;
  const target = poseInBase(robot, step.kind === 'point' ? step.pose : step.floor.poses[0]);
  const via = step.step.viaMm.map((point): [number, number, number] => {
    const [x, y, z] = floorToBase(robot, point);
    return [x / 1000, y / 1000, z / 1000];
  });
  const way = straightWay(start, rollDeg === 'free' ? leastRolled(start, target) : target, via);
  const followed = makeFollower(bench.arm, solver)(from, way.poses);
  if (followed.stop) return { move: null, followed, way };
  return {
    move: { before, seconds: runTime(bench, way, followed.postures, Infinity), way, postures: followed.postures },
    followed,
    way,
  };
}
