import { isNearer, reachFamily } from './inverse/family';
import { nearestToMiddle, posturesInside, worstMiss } from './inverse/turns';
import { LIMIT_SLACK, limitShare, withinJointLimits } from './limits';
import type { Solver } from './solver';
import { hasFreeRoll, rolled, transformOfTarget } from './target';
import { identityTransform, type Transform } from './transforms';
import type { Reason, Target } from './types';

/** A posture that reaches, and the class of branch that it belongs to ('' where the chain has no classes). */
export interface ReachingPosture {
  readonly posture: number[];
  readonly branch: string;
  /** Roll about the tool's z axis away from the pose asked for (rad); 0 unless the roll is free. */
  readonly roll: number;
}

export interface ReachAnswer {
  readonly reached: boolean;
  readonly reason: Reason;
  /** Joint that forbids the spot, from zero, and by how much (rad or m); −1 where none does. */
  readonly joint: number;
  /** How far out of reach (m), or how far beyond its limit the joint would have to go (rad or m). */
  readonly by: number;
  /** Every solution inside the limits, whole-turn copies included. */
  readonly postures: ReachingPosture[];
}

/** Rolls tried where the roll is free and matters. */
export const ROLL_SAMPLES = 48;
/** The same for redundant chains, which have a family of postures for each. */
const FAMILY_ROLL_SAMPLES = 16;

/** What a posture is worth (more is better), for choosing along the family of a redundant chain. */
export type Score = (posture: ArrayLike<number>) => number;

/**
 * All postures that put the tool where the target says, or why there are none. Of the endless postures of a redundant chain: even samples of its
 * family, and of each class of branch the best by `score`, refined (without a score: the one with the most room to its limits).
 */
export function reach(solver: Solver, target: Target, score?: Score): ReachAnswer {
  const pose = transformOfTarget(target);
  const free = hasFreeRoll(target);
  if (!solver.closedForm) return reachNumerically(solver, pose, free);
  if (!free) return reachPose(solver, pose, 0, false, score);
  if (solver.toolOnLastAxis) return reachPose(solver, pose, 0, true, score);
  const samples = solver.closedForm.family ? FAMILY_ROLL_SAMPLES : ROLL_SAMPLES;
  const at = (roll: number): ReachAnswer => {
    const answer = reachPose(solver, rolled(pose, roll, identityTransform()), roll, false, score);
    return solver.closedForm!.family ? bestOfEachClass(solver, answer, score) : answer;
  };
  const stride = (2 * Math.PI) / samples;
  const answers = Array.from({ length: samples }, (_, k) => at(k * stride));
  const climbs = solver.closedForm.family ? FAMILY_ROLL_CLIMBS : ROLL_CLIMBS;
  if (score) answers.push(...climbRolls(answers, stride, climbs, at, score));
  return bestOf(answers);
}

/** Rolls from which the best one is climbed to, and steps of falling size for each. */
const ROLL_CLIMBS = 2;
/** A redundant chain has a whole family to look through at each roll. */
const FAMILY_ROLL_CLIMBS = 1;
const ROLL_HALVINGS = 6;

/** Answers at rolls beside the even samples, closer and closer about the best of them. */
function climbRolls(
  samples: readonly ReachAnswer[],
  stride: number,
  climbs: number,
  at: (roll: number) => ReachAnswer,
  score: Score,
): ReachAnswer[] {
  const worthOf = ({ postures }: ReachAnswer) => Math.max(-1, ...postures.map(({ posture }) => score(posture)));
  const tops = samples
    .map((answer, k) => ({ roll: k * stride, worth: worthOf(answer) }))
    .filter(({ worth }) => worth >= 0)
    .sort((one, other) => other.worth - one.worth)
    .slice(0, climbs);
  const found: ReachAnswer[] = [];
  for (const top of tops) {
    let { roll, worth } = top;
    for (let halving = 0, step = stride / 2; halving < ROLL_HALVINGS; halving++, step /= 2) {
      const middle = roll;
      for (const trial of [middle - step, middle + step]) {
        const answer = at(trial);
        const there = worthOf(answer);
        if (there <= worth) continue;
        [roll, worth] = [trial, there];
        found.push(answer);
      }
    }
  }
  return found;
}

/** `lastIsFree`: any value of the last joint will do, since it only rolls the tool, so it is laid in the middle of its range. */
function reachPose(solver: Solver, pose: Transform, roll: number, lastIsFree: boolean, score?: Score): ReachAnswer {
  const { family } = solver.closedForm!;
  const flange = Float64Array.from(solver.flangeOf(pose));
  const look = (parameter: number) => collect(solver, flange, parameter, roll, lastIsFree);
  return family ? reachFamily(family, look, score ?? roomOf(solver)) : look(0);
}

const roomOf =
  ({ chain }: Solver): Score =>
  (posture) =>
    limitShare(chain, posture);

const miss = new Float64Array(2);

/** Every branch of one flange pose, at one place of the family where the chain has one. */
function collect(solver: Solver, flange: Transform, parameter: number, roll: number, lastIsFree: boolean): ReachAnswer {
  const { chain } = solver;
  const closedForm = solver.closedForm!;
  const n = chain.actuators;
  const last = n - 1;
  const middle = (chain.min[last] + chain.max[last]) / 2;
  const branches = closedForm.solve(flange, parameter);
  const postures: ReachingPosture[] = [];
  let joint = -1;
  let by = Infinity;
  for (let b = 0; b < branches.count; b++) {
    const values = branches.values.slice(b * n, (b + 1) * n);
    const turn = lastIsFree ? middle - values[last] : 0;
    if (lastIsFree) values[last] = middle;
    const branch = closedForm.nameOf(branches.codes[b]);
    for (const posture of posturesInside(chain, values))
      if (!lastIsFree || Math.abs(posture[last] - middle) < LIMIT_SLACK)
        postures.push({ posture, branch, roll: roll + turn });
    worstMiss(chain, values, 0, miss);
    if (miss[1] < by) [joint, by] = miss;
  }
  if (postures.length > 0) return { reached: true, reason: 'reached', joint: -1, by: 0, postures };
  if (branches.count > 0) return { reached: false, reason: 'joint limit', joint, by, postures };
  const reason = branches.shortfall === 'none' ? 'not found' : branches.shortfall;
  return { reached: false, reason, joint: -1, by: branches.by, postures };
}

function bestOfEachClass(solver: Solver, answer: ReachAnswer, score: Score = roomOf(solver)): ReachAnswer {
  const best = new Map<string, { posture: ReachingPosture; worth: number }>();
  for (const posture of answer.postures) {
    const worth = score(posture.posture);
    const known = best.get(posture.branch);
    if (!known || worth > known.worth) best.set(posture.branch, { posture, worth });
  }
  return { ...answer, postures: Array.from(best.values(), ({ posture }) => posture) };
}

function bestOf(answers: ReachAnswer[]): ReachAnswer {
  const postures = withoutTwins(answers.flatMap((answer) => answer.postures));
  if (postures.length > 0) return { reached: true, reason: 'reached', joint: -1, by: 0, postures };
  return answers.reduce((best, answer) => (isNearer(answer, best) ? answer : best));
}

/** Arms that take no roll answer every roll with the same postures. */
function withoutTwins(postures: ReachingPosture[]): ReachingPosture[] {
  const kept: ReachingPosture[] = [];
  for (const candidate of postures) {
    const twin = kept.some(({ posture }) => posture.every((q, i) => Math.abs(q - candidate.posture[i]) < LIMIT_SLACK));
    if (!twin) kept.push(candidate);
  }
  return kept;
}

function reachNumerically(solver: Solver, pose: Transform, freeRoll: boolean): ReachAnswer {
  const { solutions, reason, joint, by } = solver.solveNumerically(pose, freeRoll);
  const postures = solutions.map((posture) => ({ posture, branch: '', roll: 0 }));
  return { reached: postures.length > 0, reason, joint, by, postures };
}

/** The copy of a closed-form posture that maps show: every joint as near to the middle of its range as whole turns allow. */
export function middleCopy(solver: Solver, values: Float64Array, at: number, out: Float64Array): boolean {
  const { chain } = solver;
  for (let i = 0; i < chain.actuators; i++) {
    const value = nearestToMiddle(chain, i, values[at + i]);
    if (value < chain.min[i] - LIMIT_SLACK || value > chain.max[i] + LIMIT_SLACK) return false;
    out[i] = value;
  }
  return withinJointLimits(chain, out);
}
