import { reach, type ReachAnswer } from '@/lib/kinematics/reach';
import type { Arm, WristMode } from '@/lib/kinematics/types';
import { bestOf, candidatesOf, makeBench, worthOn, type Bench } from './bench';
import type { Item } from './items';
import { floorTaskPoints, targetInBase, type FloorTaskPoint } from './task-points';
import { bandOf, shortfallWords, singularWords, slowWords, type VerdictBand } from './verdict-words';

/** How one robot does at one task point. Joints count from 1. */
export interface RobotVerdict {
  readonly robotId: string;
  readonly reached: boolean;
  /** Reached, and fast enough where a speed is wanted. */
  readonly met: boolean;
  readonly band: VerdictBand;
  /** What is wrong, as a sentence; null where nothing is. */
  readonly reason: string | null;
  /** The joint that forbids the point, or that bounds the speed where it is reached; null where no single one does. */
  readonly bindingJoint: number | null;
  /** At the best branch; null where the point is not reached. */
  readonly posture: ReachedPosture | null;
  /** Sure speed less wanted speed, mm/s; null where none is wanted or the point is not reached. */
  readonly speedMarginMmS: number | null;
}

export interface ReachedPosture {
  /** Joint values, rad or m. */
  readonly joints: readonly number[];
  /** Class of the branch, such as the kernel names it; '' for a chain without classes. */
  readonly branch: string;
  /** Branches that reach the point. */
  readonly branches: readonly string[];
  readonly inverseConditionNumber: number;
  /** Infinite in a singular posture. */
  readonly conditionNumber: number;
  readonly maximumToolSpeedMmS: number;
  readonly sureSpeedMmS: number;
  /** Joint nearest to a limit, and its distance as a share of its range. */
  readonly limitJoint: number;
  readonly limitShare: number;
}

export interface PointVerdict {
  readonly pointId: string;
  readonly pointName: string;
  readonly fixtureId: string;
  readonly fixtureName: string;
  readonly positionMm: readonly [number, number, number];
  readonly wantedSpeedMmS: number | null;
  /** The robot that does best; null on a sheet without robots. */
  readonly best: RobotVerdict | null;
  /** Every robot, in the order of the sheet. */
  readonly robots: readonly RobotVerdict[];
}

/**
 * The verdict on every task point of a sheet, in the order of the work.
 * @param armOf definition of an arm of the library; robots whose arm is not known are left out.
 */
export function judgeItems(
  items: readonly Item[],
  armOf: (armId: string) => Arm | undefined,
  wrist: WristMode,
): PointVerdict[] {
  const benches = items.flatMap((item) => {
    const arm = item.kind === 'robot' ? armOf(item.armId) : undefined;
    return item.kind === 'robot' && arm ? [makeBench(item, arm, wrist)] : [];
  });
  return floorTaskPoints(items).map((point) => {
    const robots = benches.map((bench) => judge(bench, point));
    return {
      pointId: point.point.id,
      pointName: point.point.name,
      fixtureId: point.fixtureId,
      fixtureName: point.fixtureName,
      positionMm: point.positionMm,
      wantedSpeedMmS: point.point.speedMmS,
      best: robots.length === 0 ? null : robots.reduce(betterOf),
      robots,
    };
  });
}

/** One that meets the point goes before one that does not, then the better conditioned; the earlier one on a tie. */
function betterOf(best: RobotVerdict, next: RobotVerdict): RobotVerdict {
  const rank = ({ met, reached, posture }: RobotVerdict): number =>
    (met ? 2 : 0) + (reached ? 1 : 0) + (posture?.inverseConditionNumber ?? -1);
  return rank(next) > rank(best) ? next : best;
}

function judge(bench: Bench, point: FloorTaskPoint): RobotVerdict {
  const answer = reach(bench.solver, targetInBase(point, bench.robot), worthOn(bench));
  const wanted = point.point.speedMmS;
  const candidates = candidatesOf(bench, answer);
  if (candidates.length === 0) return refused(bench, answer);
  const best = bestOf(candidates, wanted);

  const { inverseConditionNumber, bindingJoint } = best;
  const conditionNumber = inverseConditionNumber > 0 ? 1 / inverseConditionNumber : Infinity;
  const band = bandOf(conditionNumber);
  const met = wanted === null || best.sureSpeedMmS >= wanted;
  return {
    robotId: bench.robot.id,
    reached: true,
    met,
    band,
    reason: !met
      ? slowWords(bindingJoint, best.sureSpeedMmS, wanted)
      : band === 'pinned'
        ? singularWords(conditionNumber, bindingJoint)
        : null,
    bindingJoint,
    posture: {
      joints: best.posture,
      branch: best.branch,
      branches: [...new Set(candidates.map(({ branch }) => branch))],
      inverseConditionNumber,
      conditionNumber,
      maximumToolSpeedMmS: best.maximumToolSpeedMmS,
      sureSpeedMmS: best.sureSpeedMmS,
      limitJoint: best.margin.joint + 1,
      limitShare: best.margin.share,
    },
    speedMarginMmS: wanted === null ? null : best.sureSpeedMmS - wanted,
  };
}

function refused({ robot, solver }: Bench, { reason, joint, by }: ReachAnswer): RobotVerdict {
  const bindingJoint = joint < 0 ? null : joint + 1;
  const prismatic = joint >= 0 && solver.chain.prismatic[joint] === 1;
  return {
    robotId: robot.id,
    reached: false,
    met: false,
    band: 'out',
    reason: shortfallWords({ reason, joint: bindingJoint, prismatic, by }),
    bindingJoint,
    posture: null,
    speedMarginMmS: null,
  };
}
