import type { Solver } from './solver';
import { posturesInside, missBy, nearestToMiddle } from './inverse/turns';
import { hasFreeRoll, rolled, transformOfTarget } from './target';
import { identityTransform, type Transform } from './transforms';
import { LIMIT_SLACK } from './limits';
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

/** All postures that put the tool where the target says, or why there are none. */
export function reach(solver: Solver, target: Target): ReachAnswer {
  const pose = transformOfTarget(target);
  const free = hasFreeRoll(target);
  if (!solver.closedForm) return reachNumerically(solver, pose, free);
  if (!free) return reachPose(solver, pose, 0);
  if (solver.toolOnLastAxis) return reachOnAxis(solver, pose);
  return bestOf(
    Array.from({ length: ROLL_SAMPLES }, (_, k) => {
      const roll = (2 * Math.PI * k) / ROLL_SAMPLES;
      return reachPose(solver, rolled(pose, roll, identityTransform()), roll);
    }),
  );
}

function reachPose(solver: Solver, pose: Transform, roll: number): ReachAnswer {
  const { chain, closedForm } = solver;
  const branches = closedForm!.solve(solver.flangeOf(pose));
  const n = chain.joints;
  const postures: ReachingPosture[] = [];
  let joint = -1;
  let by = Infinity;
  for (let b = 0; b < branches.count; b++) {
    const values = branches.values.subarray(b * n, (b + 1) * n);
    const branch = closedForm!.nameOf(branches.codes[b]);
    for (const posture of posturesInside(chain, values)) postures.push({ posture, branch, roll });
    const worst = worstMiss(solver, values);
    if (worst.by < by) ({ joint, by } = worst);
  }
  if (postures.length > 0) return { reached: true, reason: 'reached', joint: -1, by: 0, postures };
  if (branches.count > 0) return { reached: false, reason: 'joint limit', joint, by, postures };
  const reason = branches.shortfall === 'none' ? 'not found' : branches.shortfall;
  return { reached: false, reason, joint: -1, by: branches.by, postures };
}

/** The joint that misses its limits by most in one posture. */
function worstMiss({ chain }: Solver, values: ArrayLike<number>): { joint: number; by: number } {
  let joint = -1;
  let by = 0;
  for (let i = 0; i < chain.joints; i++) {
    const miss = missBy(chain, i, values[i]);
    if (miss > by) {
      by = miss;
      joint = i;
    }
  }
  return { joint, by };
}

/** A free roll about the last axis: any value of the last joint will do, so it is laid in the middle of its range. */
function reachOnAxis(solver: Solver, pose: Transform): ReachAnswer {
  const { chain, closedForm } = solver;
  const last = chain.joints - 1;
  const middle = (chain.min[last] + chain.max[last]) / 2;
  const branches = closedForm!.solve(solver.flangeOf(pose));
  const postures: ReachingPosture[] = [];
  let joint = -1;
  let by = Infinity;
  for (let b = 0; b < branches.count; b++) {
    const values = Array.from(branches.values.subarray(b * chain.joints, (b + 1) * chain.joints));
    const roll = middle - values[last];
    values[last] = middle;
    const branch = closedForm!.nameOf(branches.codes[b]);
    for (const posture of posturesInside(chain, values))
      if (Math.abs(posture[last] - middle) < LIMIT_SLACK) postures.push({ posture, branch, roll });
    const worst = worstMiss(solver, values);
    if (worst.by < by) ({ joint, by } = worst);
  }
  if (postures.length > 0) return { reached: true, reason: 'reached', joint: -1, by: 0, postures };
  if (branches.count > 0) return { reached: false, reason: 'joint limit', joint, by, postures };
  const reason = branches.shortfall === 'none' ? 'not found' : branches.shortfall;
  return { reached: false, reason, joint: -1, by: branches.by, postures };
}

/** Which refusal comes nearest to an answer, so that it is the one to tell. */
const NEARNESS: readonly Reason[] = [
  'joint limit',
  'direction',
  'too near',
  'too far',
  'not found',
  'obstacle',
  'reached',
];

function bestOf(answers: ReachAnswer[]): ReachAnswer {
  const postures = withoutTwins(answers.flatMap((answer) => answer.postures));
  if (postures.length > 0) return { reached: true, reason: 'reached', joint: -1, by: 0, postures };
  return answers.reduce((best, answer) => {
    const order = NEARNESS.indexOf(answer.reason) - NEARNESS.indexOf(best.reason);
    return order < 0 || (order === 0 && answer.by < best.by) ? answer : best;
  });
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
  for (let i = 0; i < chain.joints; i++) {
    const value = nearestToMiddle(chain, i, values[at + i]);
    if (value < chain.min[i] - LIMIT_SLACK || value > chain.max[i] + LIMIT_SLACK) return false;
    out[i] = value;
  }
  return true;
}
