'use client';

import { Check } from 'lucide-react';
import type { ReactNode } from 'react';
import { classNames } from '@/components/ui/class-names';
import { lineState, STEPS, type StepName } from '@/lib/layout/calibration-draft';
import { LineStep } from './line-step';
import { PointFields } from './point-fields';
import { STEP_WORDS } from './step-words';
import type { CalibrationInHand } from './use-calibration';

function stateWord(step: StepName, calibration: CalibrationInHand): { word: string; tone: string; done: boolean } {
  const soft = 'text-ink-soft';
  if (step === 'origin') {
    const [x, y] = calibration.draft.originPx;
    return { word: `${Math.round(x)}, ${Math.round(y)} px`, tone: soft, done: true };
  }
  const state = lineState(calibration.draft, step);
  if (state === 'complete' && !calibration.faults[step]) return { word: 'Done', tone: 'text-green', done: true };
  if (state === 'empty') return { word: step === 'scale' ? 'To do' : 'Optional', tone: soft, done: false };
  return { word: 'Not finished', tone: 'text-amber', done: false };
}

/** The four steps, one open at a time; any of them can be gone back to. */
export function CalibrationSteps({ calibration }: { calibration: CalibrationInHand }) {
  return (
    <ol>
      {STEPS.map((step, index) => {
        const isOpen = calibration.step === step;
        const { word, tone, done } = stateWord(step, calibration);
        return (
          <li key={step} className={classNames('border-b border-rule', isOpen && 'border-l-4 border-l-petrol')}>
            <h2>
              <button
                type="button"
                aria-expanded={isOpen}
                aria-controls={`step-${step}`}
                onClick={() => calibration.deeds.openStep(step)}
                className={classNames(
                  'flex min-h-11 w-full items-center gap-3 px-3.5 text-left hover:bg-petrol-wash focus-visible:-outline-offset-2',
                  isOpen && 'pl-2.5',
                )}
              >
                <span className="w-3 font-mono text-sm text-ink-soft">{index + 1}</span>
                <span className="flex-1 font-semibold">{STEP_WORDS[step].title}</span>
                <span className={classNames('flex items-center gap-1 text-sm', tone)}>
                  {done && step !== 'origin' && <Check aria-hidden className="size-4" />}
                  {word}
                </span>
              </button>
            </h2>
            {isOpen && (
              <StepBody step={step}>
                {step === 'origin' ? (
                  <PointFields handle="origin" calibration={calibration} />
                ) : (
                  <LineStep line={step} calibration={calibration} />
                )}
              </StepBody>
            )}
          </li>
        );
      })}
    </ol>
  );
}

function StepBody({ step, children }: { step: StepName; children: ReactNode }) {
  return (
    <div id={`step-${step}`} className="flex flex-col gap-3 px-2.5 pb-4 pl-2.5">
      <p className="text-sm text-ink-soft">{STEP_WORDS[step].body}</p>
      {children}
    </div>
  );
}
