import {
  invertTransform,
  identityTransform,
  multiplyTransforms,
  poseOf,
  transformOf,
} from '@/lib/kinematics/transforms';
import type { Arm, Target } from '@/lib/kinematics/types';
import { judgeTarget, type RobotVerdict } from '../judging/point-verdict';
import { poseInBase } from '../robot-frame';
import { poseOnFloor } from '../task-points';
import { VERDICT_BANDS } from '../verdict-words';
import type { ToleranceAnswer } from './answer';
import type { ToleranceQuestion, WorkPoint } from './question';
import { studyBench } from './study-bench';

/** Some trials: how often everything held, and how often each point did. */
export interface ToleranceTrials {
  readonly kept: number;
  readonly keptByPoint: readonly number[];
}

export interface ToleranceComputer {
  trials(from: number, to: number): ToleranceTrials;
  answer(slices: readonly ToleranceTrials[]): ToleranceAnswer;
}

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

/**
 * How often the verdicts survive a base that was set down a little wrong. In each trial the base is off by a random error; a
 * point keeps its verdict where it is still reached, still fast enough if it was, and in no worse band. Trials are numbered
 * and seeded one by one, so that slices may be computed anywhere in any order.
 */
export function makeToleranceComputer(question: ToleranceQuestion, arm: Arm): ToleranceComputer {
  const { points, robot, seed } = question;
  const bench = studyBench(question, arm);
  const inBase = points.map((point) => poseInBase(robot, poseOnFloor(point.fixture, point)));
  const judged = (index: number, pose = inBase[index]): RobotVerdict =>
    judgeTarget(bench, targetOf(points[index], pose), points[index].speedMmS);
  const asDrawn = points.map((_, index) => judged(index));

  function trials(from: number, to: number): ToleranceTrials {
    const keptByPoint = points.map(() => 0);
    let kept = 0;
    for (let trial = from; trial < to; trial += 1) {
      const toErred = invertTransform(baseError(question, seed, trial), identityTransform());
      let all = true;
      asDrawn.forEach((before, index) => {
        if (!before.reached) return;
        const pose = multiplyTransforms(toErred, inBase[index], identityTransform());
        if (keeps(before, judged(index, pose))) keptByPoint[index] += 1;
        else all = false;
      });
      if (all) kept += 1;
    }
    return { kept, keptByPoint };
  }

  function answer(slices: readonly ToleranceTrials[]): ToleranceAnswer {
    const kept = slices.reduce((sum, slice) => sum + slice.kept, 0);
    return {
      study: 'tolerance',
      trials: question.trials,
      kept,
      share: kept / question.trials,
      interval: wilsonInterval(kept, question.trials),
      keptByPoint: asDrawn.map(({ reached }, index) =>
        reached ? slices.reduce((sum, slice) => sum + slice.keptByPoint[index], 0) : null,
      ),
    };
  }
  return { trials, answer };
}

function targetOf({ rollDeg }: WorkPoint, t: Float64Array): Target {
  if (rollDeg !== 'free') return { pose: poseOf(t) };
  return { position: [t[3], t[7], t[11]], direction: [t[2], t[6], t[10]], roll: 'free' };
}

function keeps(before: RobotVerdict, after: RobotVerdict): boolean {
  const bandBefore = VERDICT_BANDS.indexOf(before.band);
  return after.reached && (after.met || !before.met) && VERDICT_BANDS.indexOf(after.band) <= bandBefore;
}

/** The base as it came to stand, seen from where it should stand. */
function baseError({ placeMm, turnDeg, levelDeg }: ToleranceQuestion, seed: number, trial: number) {
  const random = seeded(seed, trial);
  const within = (most: number): number => (2 * random() - 1) * most;
  return transformOf({
    xyz: [within(placeMm / 1000), within(placeMm / 1000), within(placeMm / 1000)],
    rpy: [within(radians(levelDeg)), within(radians(levelDeg)), within(radians(turnDeg))],
  });
}

/** A stream of numbers 0 … 1 of its own for every trial: the public-domain generator known as mulberry32. */
function seeded(seed: number, trial: number): () => number {
  let state = (Math.imul(seed + 1, 0x9e3779b1) ^ Math.imul(trial + 1, 0x85ebca6b)) >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** 97.5 % quantile of the normal distribution. */
const Z = 1.959964;

/** Where the true share lies with 95 % (Wilson 1927). */
export function wilsonInterval(hits: number, trials: number): [number, number] {
  const share = hits / trials;
  const bend = (Z * Z) / trials;
  const middle = (share + bend / 2) / (1 + bend);
  const half = (Z / (1 + bend)) * Math.sqrt((share * (1 - share)) / trials + bend / (4 * trials));
  return [Math.max(0, middle - half), Math.min(1, middle + half)];
}
