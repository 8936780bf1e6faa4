import type { StudyAnswer } from '@/lib/layout/standing/answer';
import { answerOf, computeParts } from '@/lib/layout/standing/study';
import type { AnswerTask, SliceResult, SliceTask } from './computer';

/** The work itself, as a thread does it; pure, so that it gives the same answer wherever it runs. */

export function computeSlice({ question, arm, from, to }: SliceTask): SliceResult {
  try {
    return { slice: computeParts(question, arm, from, to) };
  } catch (error) {
    if (!(error instanceof Error)) throw error;
    return { fault: error.message };
  }
}

export function answerStudy({ question, arm, slices }: AnswerTask): StudyAnswer {
  return answerOf(question, arm, slices);
}
