import type { Arm } from '@/lib/kinematics/types';
import { studyArm, type StudyStep } from '@/lib/layout/arm-study';

/** Computes the study of one arm after another; a new question puts an end to the one before. */

export interface StudyQuestion {
  readonly number: number;
  readonly arm: Arm;
}

export interface StudyAnswer {
  readonly number: number;
  readonly steps: readonly StudyStep[];
}

/** How long it works before it looks for a new question and tells what it has. */
const SLICE_MS = 40;

const scope = self as unknown as {
  onmessage: ((event: MessageEvent<StudyQuestion>) => void) | null;
  postMessage: (answer: StudyAnswer) => void;
};

let current = 0;

scope.onmessage = ({ data: { number, arm } }) => {
  current = number;
  const study = studyArm(arm);
  const work = (): void => {
    if (number !== current) return;
    const until = performance.now() + SLICE_MS;
    const steps: StudyStep[] = [];
    let ended = false;
    while (!ended && performance.now() < until) {
      const { done, value } = study.next();
      ended = done === true;
      if (value) steps.push(value);
    }
    if (steps.length > 0) scope.postMessage({ number, steps });
    if (!ended) setTimeout(work);
  };
  work();
};
