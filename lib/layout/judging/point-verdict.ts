import { reach, type ReachAnswer } from '@/lib/kinematics/reach';
import type { Target } from '@/lib/kinematics/types';
import { bestOf, candidatesOf, worthOn, type Bench, type Candidate } from '../bench';
import {
  bandOf,
  closeToLimitWords,
  onlyWords,
  shortfallWords,
  singularWords,
  slowWords,
  type VerdictBand,
} from '../verdict-words';

/** How one robot does at one task point. Joints count from 1. */
export interface RobotVerdict {
  readonly robotId: string;
  readonly reached: boolean;
  /** Reached, and fast enough where a speed is wanted. */
  readonly met: boolean;
  readonly band: VerdictBand;
  /** What is wrong, as a sentence; null where nothing is. */
  readonly reason: string | null;
  /** What else is worth knowing, as sentences: only one kind of branch reaches it, a joint stands close to its limit. */
  readonly notes: readonly string[];
  /** The joint that forbids the point, or that bounds the speed where it is reached; null where no single one does. */
  readonly bindingJoint: number | null;
  /** At the best branch; null where the point is not reached. */
  readonly posture: ReachedPosture | null;
  /** Sure speed less wanted speed, mm/s; null where none is wanted or the point is not reached. */
  readonly speedMarginMmS: number | null;
  /** How far out of reach or too near, mm; null where that is not what is wrong. */
  readonly shortfallMm: number | null;
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
  /** Joint nearest to a limit, its distance as a share of its range, and as it is: rad, or m where it slides. */
  readonly limitJoint: number;
  readonly limitShare: number;
  readonly limitDistance: number;
  readonly limitSlides: boolean;
}

/** What one robot can do at one tool pose. `target`: in its base frame (m). `wantedMmS`: wanted speed in every direction, or null. */
export function judgeTarget(bench: Bench, target: Target, wantedMmS: number | null): RobotVerdict {
  const answer = reach(bench.solver, target, worthOn(bench));
  const candidates = candidatesOf(bench, answer);
  if (candidates.length === 0) return refused(bench, answer);
  const best = bestOf(candidates, wantedMmS);
  const { inverseConditionNumber, bindingJoint } = best;
  const conditionNumber = inverseConditionNumber > 0 ? 1 / inverseConditionNumber : Infinity;
  const band = bandOf(conditionNumber);
  const met = wantedMmS === null || best.sureSpeedMmS >= wantedMmS;
  const branches = [...new Set(candidates.map(({ branch }) => branch))];
  return {
    robotId: bench.robot.id,
    reached: true,
    met,
    band,
    reason: !met
      ? slowWords(bindingJoint, best.sureSpeedMmS, wantedMmS)
      : band === 'pinned'
        ? singularWords(conditionNumber, bindingJoint)
        : null,
    notes: [...onlyWords(branches, bench.solver.closedForm ? classNamesOf(bench) : []), ...limitNotes(bench, best)],
    bindingJoint,
    posture: {
      joints: best.posture,
      branch: best.branch,
      branches,
      inverseConditionNumber,
      conditionNumber,
      maximumToolSpeedMmS: best.maximumToolSpeedMmS,
      sureSpeedMmS: best.sureSpeedMmS,
      limitJoint: best.margin.joint + 1,
      limitShare: best.margin.share,
      limitDistance: best.margin.angle,
      limitSlides: bench.solver.chain.prismatic[best.margin.joint] === 1,
    },
    speedMarginMmS: wantedMmS === null ? null : best.sureSpeedMmS - wantedMmS,
    shortfallMm: null,
  };
}

/** Every class of branch that the arm has. */
function classNamesOf({ solver }: Bench): string[] {
  const { classes, nameOf } = solver.closedForm!;
  return Array.from({ length: classes }, (_, code) => nameOf(code));
}

function limitNotes({ solver }: Bench, { margin }: Candidate): string[] {
  const words = closeToLimitWords(margin.joint + 1, margin.angle, solver.chain.prismatic[margin.joint] === 1);
  return words === null ? [] : [words];
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
    notes: [],
    bindingJoint,
    posture: null,
    speedMarginMmS: null,
    shortfallMm: reason === 'too far' || reason === 'too near' ? by * 1000 : null,
  };
}

/**
 * The place of a verdict among others: one that is met after one that is reached after one that is not; then by conditioning, and of
 * those not reached by how little is missing.
 */
export function worthOfVerdict({ met, reached, posture, shortfallMm }: RobotVerdict): number {
  if (!reached) return -1 - (shortfallMm ?? 0);
  return (met ? 3 : 1) + (posture?.inverseConditionNumber ?? 0);
}

/** One that meets the point goes before one that does not, then the better conditioned; the earlier one on a tie. */
export function betterOf(best: RobotVerdict, next: RobotVerdict): RobotVerdict {
  return worthOfVerdict(next) > worthOfVerdict(best) ? next : best;
}
