import { makeSolver } from '@/lib/kinematics/solver';
import type { Arm } from '@/lib/kinematics/types';
import { partCount, workPerPart } from '@/lib/layout/standing/study';
import type { StudyQuestion } from '@/lib/layout/standing/question';
import { armWithTool } from '@/lib/layout/robot-frame';

/** How a study is cut into jobs. Work is counted in points judged by a closed form, some 150 µs each with their measures. */

/** About half a second: little to lose when a worker dies, and long beside what the queue costs. */
const WORK_PER_SLICE = 3000;
/** About 25 minutes of one core. */
export const WORK_LIMIT = 10_000_000;
const SECONDS_PER_WORK = 150e-6;

/** Against a plain point: a searched roll takes dozens of solutions, a redundant arm a family of them, another arm iterates. */
const SEARCHED_ROLL_WORK = 40;
const FAMILY_WORK = 8;
const SEARCHED_FAMILY_WORK = 80;
const NUMERICAL_WORK = 400;

export interface StudyInput {
  readonly question: StudyQuestion;
  readonly arm: Arm;
}

function workOfPoint({ question, arm }: StudyInput): number {
  const { closedForm, toolOnLastAxis } = makeSolver(armWithTool(arm, question.tool));
  if (!closedForm) return NUMERICAL_WORK;
  const poses = question.study === 'errorGain' ? [question] : question.points;
  const searches = !toolOnLastAxis && poses.some(({ rollDeg }) => rollDeg === 'free');
  if (closedForm.family) return searches ? SEARCHED_FAMILY_WORK : FAMILY_WORK;
  return searches ? SEARCHED_ROLL_WORK : 1;
}

export function workOf(input: StudyInput): number {
  return partCount(input.question) * workPerPart(input.question) * workOfPoint(input);
}

export function sliceCountOf(input: StudyInput): number {
  const parts = partCount(input.question);
  const perSlice = Math.max(1, Math.floor(WORK_PER_SLICE / (workPerPart(input.question) * workOfPoint(input))));
  return Math.ceil(parts / perSlice);
}

/** Seconds that a slice takes at most on an idle core. */
export function secondsPerSlice(input: StudyInput): number {
  const parts = Math.ceil(partCount(input.question) / sliceCountOf(input));
  return parts * workPerPart(input.question) * workOfPoint(input) * SECONDS_PER_WORK;
}

/** The parts from … to − 1 of a slice; follows from the stored count alone. */
export function partsOfSlice(question: StudyQuestion, sliceCount: number, index: number): { from: number; to: number } {
  const parts = partCount(question);
  const start = (slice: number): number => Math.floor((slice * parts) / sliceCount);
  return { from: start(index), to: start(index + 1) };
}
