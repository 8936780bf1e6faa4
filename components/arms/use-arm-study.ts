'use client';

import { useEffect, useReducer, useRef } from 'react';
import type { ArmDefinition } from '@/lib/contracts/arm';
import { studyArm, type StudyStep } from '@/lib/layout/arm-study';
import type { StudyAnswer, StudyQuestion } from './arm-study-worker';

type Facts = Extract<StudyStep, { kind: 'facts' }>;

export interface ArmStudy {
  readonly facts: Facts | null;
  /** The map of the cut so far: all of it in large cells, the lower rows in small ones. */
  readonly map: {
    readonly coarse: Extract<StudyStep, { kind: 'coarse' }>;
    readonly fineGrid: Facts['grid'];
    readonly fine: readonly Float32Array[];
  } | null;
  /** Undefined while it is being worked out. */
  readonly fastestMPerS: number | null | undefined;
}

const NOTHING: ArmStudy = { facts: null, map: null, fastestMPerS: undefined };

/** What is shown of the arm before stays until there is something of the new one to put in its place. */
function withStep(study: ArmStudy, step: StudyStep): ArmStudy {
  switch (step.kind) {
    case 'facts':
      return { ...study, facts: step, fastestMPerS: undefined, map: step.reachMm < 1 ? null : study.map };
    case 'coarse':
      return study.facts ? { ...study, map: { coarse: step, fineGrid: study.facts.grid, fine: [] } } : study;
    case 'row':
      return study.map ? { ...study, map: { ...study.map, fine: [...study.map.fine, step.values] } } : study;
    case 'done':
      return { ...study, fastestMPerS: step.fastestMPerS };
  }
}

const withSteps = (study: ArmStudy, steps: readonly StudyStep[]): ArmStudy => steps.reduce(withStep, study);

/** Computing on the page itself pauses after this long, where there are no workers. */
const SLICE_MS = 12;

/** Reach, method, section map and posture of an arm, computed beside the page so that typing never waits. */
export function useArmStudy(definition: ArmDefinition | null): ArmStudy {
  const [study, take] = useReducer(withSteps, NOTHING);
  const worker = useRef<Worker | null>(null);
  const number = useRef(0);
  useEffect(
    () => () => {
      worker.current?.terminate();
      worker.current = null;
    },
    [],
  );
  useEffect(() => {
    if (!definition) return;
    number.current += 1;
    const asked: StudyQuestion = { number: number.current, arm: definition };
    if (typeof Worker === 'undefined') return studyHere(asked, take);
    worker.current ??= new Worker(new URL('./arm-study-worker.ts', import.meta.url), { type: 'module' });
    worker.current.onmessage = ({ data }: MessageEvent<StudyAnswer>) => {
      if (data.number === number.current) take(data.steps);
    };
    worker.current.postMessage(asked);
  }, [definition]);
  return study;
}

function studyHere({ arm }: StudyQuestion, take: (steps: readonly StudyStep[]) => void): () => void {
  const steps = studyArm(arm);
  let timer: ReturnType<typeof setTimeout>;
  const work = (): void => {
    const until = performance.now() + SLICE_MS;
    const found: StudyStep[] = [];
    let ended = false;
    while (!ended && performance.now() < until) {
      const { done, value } = steps.next();
      ended = done === true;
      if (value) found.push(value);
    }
    if (found.length > 0) take(found);
    if (!ended) timer = setTimeout(work);
  };
  timer = setTimeout(work);
  return () => clearTimeout(timer);
}
