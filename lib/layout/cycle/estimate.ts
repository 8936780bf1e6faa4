import { branchOf, makeFollower } from '@/lib/kinematics/motion/follow';
import { jointMove } from '@/lib/kinematics/motion/profile';
import type { ArmOf } from '../judging/cell-judge';
import { makeBench, type Bench } from '../bench';
import type { Item, Robot } from '../items';
import { buildLayers } from './build-layers';
import { chooseStates, type Chosen } from './choose-states';
import { pathWay, type Layer, type MotionStep } from './layers';
import { resolveSteps, type ResolvedStep } from './resolve-steps';
import { readRun, type Crossing, type RunReading } from './straight-run';

/** One step of a robot's cycle, timed. Always an estimate: no rounding of corners, no settling, no controller. */
export interface TimedStep {
  readonly stepId: string;
  readonly kind: 'point' | 'path' | 'wait' | 'zone';
  readonly label: string;
  /** Getting there; 0 for waits and zones. */
  readonly moveS: number;
  readonly motion: 'joint' | 'straight' | null;
  /** Along the path itself; 0 for anything else. */
  readonly runS: number;
  /** Standing still: dwell or wait. */
  readonly holdS: number;
  /** The joint that the move or run waits for, from 1; null where nothing moves. */
  readonly slowestJoint: number | null;
  /** Of the straight way and the path; null for joint moves. */
  readonly lengthMm: number | null;
  /** Least speed that the joints allow on the straight way and the path; null for joint moves. */
  readonly leastSpeedMmS: number | null;
  readonly crossings: readonly Crossing[];
  /** Class of branch and joint values (rad, m) at the end; '' and null for waits and zones. */
  readonly branch: string;
  readonly posture: readonly number[] | null;
}

/** What is the matter with a step: it is left out, or timed otherwise than asked for, and the rest is still timed. */
export interface StepProblem {
  readonly stepId: string;
  /** From 1. */
  readonly number: number;
  readonly label: string;
  readonly message: string;
}

export interface CycleEstimate {
  readonly robotId: string;
  readonly robotName: string;
  readonly steps: readonly TimedStep[];
  readonly problems: readonly StepProblem[];
  /** From the last step round to the last step, without waiting for zones. */
  readonly totalS: number;
  readonly targetS: number | null;
  /** Target less total; null without a target. */
  readonly marginS: number | null;
}

/** The cycles of all robots of a sheet that have steps, in the order of the sheet; robots whose arm is not known are left out. */
export function estimateCycles(items: readonly Item[], armOf: ArmOf): CycleEstimate[] {
  return items.flatMap((item) => {
    if (item.kind !== 'robot' || item.sequence.length === 0) return [];
    const arm = armOf(item.armId);
    return arm ? [estimateCycle(makeBench(item, arm, 'held'), items)] : [];
  });
}

/** Times a robot's sequence, with the branches that make the whole round quickest. */
export function estimateCycle(bench: Bench, items: readonly Item[]): CycleEstimate {
  return estimateSteps(bench, resolveSteps(bench.robot.sequence, items));
}

/** The same for steps that are looked up already. */
export function estimateSteps(bench: Bench, resolved: readonly ResolvedStep[]): CycleEstimate {
  const { robot } = bench;
  const problems: StepProblem[] = [];
  const name = (step: ResolvedStep, message: string): void => {
    const number = resolved.indexOf(step) + 1;
    problems.push({ stepId: step.step.id, number, label: step.label, message });
  };
  const { moves, layers } = buildLayers(bench, resolved, name);
  const chosen = chooseStates(bench, moves, layers, name);
  const timed = timeMoves(bench, moves, layers, chosen);
  const steps = resolved.flatMap((step): TimedStep[] => {
    if (step.kind === 'lost') {
      name(step, step.message);
      return [];
    }
    if (step.kind === 'wait') return [still(step, step.step.seconds)];
    if (step.kind === 'zone') return [still(step, 0)];
    const move = timed.get(step.step.id);
    return move ? [move] : [];
  });
  problems.sort((a, b) => a.number - b.number);
  return summedUp(robot, steps, problems);
}

function summedUp(robot: Robot, steps: TimedStep[], problems: StepProblem[]): CycleEstimate {
  const totalS = steps.reduce((sum, { moveS, runS, holdS }) => sum + moveS + runS + holdS, 0);
  const { targetCycleS } = robot;
  return {
    robotId: robot.id,
    robotName: robot.name,
    steps,
    problems,
    totalS,
    targetS: targetCycleS,
    marginS: targetCycleS === null ? null : targetCycleS - totalS,
  };
}

function still({ kind, step, label }: Extract<ResolvedStep, { kind: 'wait' | 'zone' }>, holdS: number): TimedStep {
  return {
    stepId: step.id,
    kind,
    label,
    moveS: 0,
    motion: null,
    runS: 0,
    holdS,
    slowestJoint: null,
    lengthMm: null,
    leastSpeedMmS: null,
    crossings: [],
    branch: '',
    posture: null,
  };
}

function timeMoves(
  bench: Bench,
  moves: readonly MotionStep[],
  layers: readonly Layer[],
  chosen: Chosen | null,
): Map<string, TimedStep> {
  const timed = new Map<string, TimedStep>();
  if (!chosen) return timed;
  const { chain } = bench.solver;
  moves.forEach((step, index) => {
    const before = (index + layers.length - 1) % layers.length;
    const [state, stateBefore] = [chosen.states[index], chosen.states[before]];
    const layer = layers[index];
    const straight = index === 0 ? chosen.closing : (layer.straightFrom?.[state] ?? null);
    const byJoints = jointMove(chain, layers[before].ends[stateBefore], layer.arrivals[state]);
    const readings: RunReading[] = straight ? [readRun(bench, straight.way, straight.postures)] : [];
    if (step.kind === 'path') {
      const way = pathWay(bench, step, layer.arrivals[state]);
      readings.push(
        readRun(bench, way, makeFollower(bench.arm, bench.solver)(layer.arrivals[state], way.poses).postures),
      );
    }
    const slowest = readings.reduce<RunReading | null>(
      (least, next) => (!least || next.leastSpeedMmS < least.leastSpeedMmS ? next : least),
      null,
    );
    timed.set(step.step.id, {
      stepId: step.step.id,
      kind: step.kind,
      label: step.label,
      moveS: straight?.seconds ?? byJoints.seconds,
      motion: straight ? 'straight' : 'joint',
      runS: layer.runS[state],
      holdS: step.kind === 'point' ? step.dwellS : 0,
      slowestJoint: slowest ? slowest.slowestJoint : byJoints.slowest < 0 ? null : byJoints.slowest + 1,
      lengthMm: readings.length === 0 ? null : readings.reduce((sum, { lengthMm }) => sum + lengthMm, 0),
      leastSpeedMmS: slowest && Number.isFinite(slowest.leastSpeedMmS) ? slowest.leastSpeedMmS : null,
      crossings: readings.flatMap(({ crossings }) => crossings),
      branch: branchOf(bench.solver, layer.ends[state]),
      posture: Array.from(layer.ends[state]),
    });
  });
  return timed;
}
