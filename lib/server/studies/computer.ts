import type { Arm } from '@/lib/kinematics/types';
import type { StudyAnswer } from '@/lib/layout/standing/answer';
import type { StudyQuestion } from '@/lib/layout/standing/question';
import type { StudySlice } from '@/lib/layout/standing/study';

/** The work of a study as it is handed to a thread: plain data in, plain data out, no database. */
export interface SliceTask {
  readonly question: StudyQuestion;
  readonly arm: Arm;
  readonly from: number;
  readonly to: number;
}

export interface AnswerTask {
  readonly question: StudyQuestion;
  readonly arm: Arm;
  readonly slices: readonly StudySlice[];
}

/** `fault` where the kernel refuses the question: why, in its own words. It would refuse it again. */
export type SliceResult = { readonly slice: StudySlice } | { readonly fault: string };

/** Where the work is done; rejects where the place itself breaks down, and then another try may help. */
export interface StudyComputer {
  computeSlice(task: SliceTask): Promise<SliceResult>;
  answerStudy(task: AnswerTask): Promise<StudyAnswer>;
}
