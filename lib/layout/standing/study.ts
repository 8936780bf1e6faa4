import type { Arm } from '@/lib/kinematics/types';
import type { StudyAnswer } from './answer';
import type { StudyQuestion } from './question';
import { makeStandingComputer, type StandingRows } from './standing-map';
import { makeToleranceComputer, type ToleranceTrials } from './tolerance';

/** A study as a list of like parts: rows of a grid, or trials. Any run of parts can be computed apart from the others. */

export type StudySlice = StandingRows | ToleranceTrials;

export function partCount(question: StudyQuestion): number {
  return question.study === 'standing' ? question.grid.rows : question.trials;
}

/** Points judged in one part. */
export function workPerPart(question: StudyQuestion): number {
  const points = question.points.length;
  if (question.study === 'tolerance') return points;
  return question.grid.columns * question.turnsDeg.length * question.risersMm.length * points;
}

export function computeParts(question: StudyQuestion, arm: Arm, from: number, to: number): StudySlice {
  return question.study === 'standing'
    ? makeStandingComputer(question, arm).rows(from, to)
    : makeToleranceComputer(question, arm).trials(from, to);
}

/** @param slices every part, in order. They come out of the store as they went in. */
export function answerOf(question: StudyQuestion, arm: Arm, slices: readonly StudySlice[]): StudyAnswer {
  return question.study === 'standing'
    ? makeStandingComputer(question, arm).answer(slices as readonly StandingRows[])
    : makeToleranceComputer(question, arm).answer(slices as readonly ToleranceTrials[]);
}
