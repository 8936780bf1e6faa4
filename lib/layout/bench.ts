import { limitMargin } from '@/lib/kinematics/limits';
import { makeGauge, type Gauge } from '@/lib/kinematics/measures/gauge';
import type { ReachAnswer, ReachingPosture, Score } from '@/lib/kinematics/reach';
import { makeSolver, type Solver } from '@/lib/kinematics/solver';
import type { Arm, LimitMargin, WristMode } from '@/lib/kinematics/types';
import type { Robot } from './items';
import { armWithTool } from './robot-frame';

/** A robot made ready to be asked about one point after another. */
export interface Bench {
  readonly robot: Robot;
  /** With the tool on it. */
  readonly arm: Arm;
  readonly solver: Solver;
  readonly gauge: Gauge;
}

export function makeBench(robot: Robot, arm: Arm, wrist: WristMode): Bench {
  const withTool = armWithTool(arm, robot.tool);
  const solver = makeSolver(withTool);
  return { robot, arm: withTool, solver, gauge: makeGauge(solver.chain, solver.freedoms, wrist) };
}

/** What a posture counts for where a redundant arm has a choice of them: its inverse condition number, as in the maps. */
export const worthOn =
  ({ solver, gauge }: Bench): Score =>
  (posture) =>
    gauge.readGains(solver.stand(posture)).inverseConditionNumber;

/** One way to reach a point, with what it is worth. */
export interface Candidate extends ReachingPosture {
  readonly inverseConditionNumber: number;
  readonly maximumToolSpeedMmS: number;
  readonly sureSpeedMmS: number;
  readonly bindingJoint: number | null;
  readonly margin: LimitMargin;
}

/**
 * One candidate for every branch and roll. Copies of a posture by whole turns measure alike, so of those only the one
 * farthest from its limits is kept.
 */
export function candidatesOf({ solver, gauge }: Bench, answer: ReachAnswer): Candidate[] {
  const found = new Map<string, Candidate>();
  for (const reaching of answer.postures) {
    const key = `${reaching.branch} ${reaching.roll}`;
    const margin = limitMargin(solver.chain, reaching.posture);
    const earlier = reaching.branch === '' ? undefined : found.get(key);
    if (earlier) {
      if (margin.share > earlier.margin.share) found.set(key, { ...earlier, ...reaching, margin });
      continue;
    }
    const reading = gauge.read(solver.stand(reaching.posture));
    found.set(reaching.branch === '' ? `${found.size}` : key, {
      ...reaching,
      inverseConditionNumber: reading.inverseConditionNumber,
      maximumToolSpeedMmS: reading.maximumToolSpeed * 1000,
      sureSpeedMmS: reading.sureSpeed * 1000,
      bindingJoint: reading.bindingActuator < 0 ? null : reading.bindingActuator + 1,
      margin,
    });
  }
  return [...found.values()];
}

/** The best of at least one: fast enough first where a speed is wanted, then the better conditioned. */
export function bestOf(candidates: readonly Candidate[], wantedMmS: number | null): Candidate {
  return candidates.reduce((best, next) => (isBetter(next, best, wantedMmS) ? next : best));
}

/** Rounding noise between mirror postures, which are equally good. */
const SAME = 1e-12;

function isBetter(next: Candidate, best: Candidate, wantedMmS: number | null): boolean {
  if (wantedMmS !== null) {
    const [nextMeets, bestMeets] = [next.sureSpeedMmS >= wantedMmS, best.sureSpeedMmS >= wantedMmS];
    if (nextMeets !== bestMeets) return nextMeets;
  }
  const difference = next.inverseConditionNumber - best.inverseConditionNumber;
  return Math.abs(difference) > SAME ? difference > 0 : next.margin.share > best.margin.share;
}
