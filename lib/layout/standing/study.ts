import type { Arm } from '@/lib/kinematics/types';
import type { StudyAnswer } from './answer';
import type { StudyQuestion } from './question';
import { makeStandingComputer, type StandingRows } from './standing-map';
import { errorGainAnswer, errorGainRows, type ErrorGainRows } from './error-gain';
import { makeToleranceComputer, type ToleranceTrials } from './tolerance';

/** A study as a list of like parts: rows of a grid, or trials. Any run of parts can be computed apart from the others. */

export type StudySlice = StandingRows | ToleranceTrials | ErrorGainRows;

export function partCount(question: StudyQuestion): number {
  return question.study === 'tolerance' ? question.trials : question.grid.rows;
}

/** Points judged in one part. */
export function workPerPart(question: StudyQuestion): number {
  if (question.study === 'errorGain') return question.grid.columns;
  const points = question.points.length;
  if (question.study === 'tolerance') return points;
  return question.grid.columns * question.turnsDeg.length * question.risersMm.length * points;
}

export function computeParts(question: StudyQuestion, arm: Arm, from: number, to: number): StudySlice {
  switch (question.study) {
    case 'standing':
      return makeStandingComputer(question, arm).rows(from, to);
    case 'tolerance':
      return makeToleranceComputer(question, arm).trials(from, to);
    case 'errorGain':
      return errorGainRows(question, arm, from, to);
  }
}

/** @param slices every part, in order. They come out of the store as they went in. */
export function answerOf(question: StudyQuestion, arm: Arm, slices: readonly StudySlice[]): StudyAnswer {
  switch (question.study) {
    case 'standing':
      return makeStandingComputer(question, arm).answer(slices as readonly StandingRows[]);
    case 'tolerance':
      return makeToleranceComputer(question, arm).answer(slices as readonly ToleranceTrials[]);
    case 'errorGain':
      return errorGainAnswer(slices as readonly ErrorGainRows[]);
  }
}
