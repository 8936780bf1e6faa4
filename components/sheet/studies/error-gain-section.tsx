'use client';

import { useState } from 'react';
import { useBoardSettings } from '@/components/sheet/editor/board-context';
import { ValueField } from '@/components/sheet/panels/value-field';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { useStudy } from '@/lib/client/use-study';
import { errorGainOfRobot } from '@/lib/layout/standing/ask';
import { Quiet, Section } from './section';
import { StudyProgress } from './study-progress';
import { useStudyStore, useStudyView } from './study-store';
import { useAsking } from './use-asking';
import { useStudySubjects } from './use-study-subjects';

/** How far off is the tool over the floor, where every joint is off by a stated error? */
export function ErrorGainSection() {
  const { robots } = useStudySubjects();
  const settings = useBoardSettings();
  const store = useStudyStore();
  const { errorGain, shown } = useStudyView();
  const followed = useStudy(errorGain?.studyId ?? null);
  const { isAsking, refusal, ask } = useAsking();
  const [robotId, setRobotId] = useState<string | null>(null);
  const [errors, setErrors] = useState({ turnErrorDeg: 0.02, slideErrorMm: 0.1 });
  const [stepMm, setStepMm] = useState(50);
  const subject = robots.find(({ robot }) => robot.id === robotId) ?? robots[0];
  if (!subject) return null;

  const start = async () => {
    const { robot, arm } = subject;
    const question = errorGainOfRobot(robot, arm.definition, settings, { ...errors, stepMm });
    const studyId = await ask(question);
    if (studyId === null) return;
    store.set({ errorGain: { studyId, question, work: [], robotId: robot.id, moverId: robot.id }, shown: 'errorGain' });
  };
  const answer = followed.study?.answer?.study === 'errorGain' ? followed.study.answer : null;
  return (
    <Section title="Error gain">
      <div className="grid gap-2">
        <Field label="Robot" inline className="grid-cols-[4.5rem_minmax(0,1fr)]!">
          <Select
            className="min-h-7 text-sm"
            value={subject.robot.id}
            onValueChange={setRobotId}
            options={robots.map(({ robot: { id, name } }) => ({ value: id, label: name }))}
          />
        </Field>
        <div className="grid grid-cols-3 gap-x-3">
          <ValueField
            label="Each turn ±"
            kind="angle"
            value={errors.turnErrorDeg}
            step={0.01}
            onCommit={(turnErrorDeg) => {
              if (turnErrorDeg < 0 || turnErrorDeg > 10) return 'Write 0 to 10.';
              setErrors((known) => ({ ...known, turnErrorDeg }));
              return null;
            }}
          />
          <ValueField
            label="Each slide ±"
            kind="length"
            value={errors.slideErrorMm}
            step={0.1}
            onCommit={(slideErrorMm) => {
              if (slideErrorMm < 0 || slideErrorMm > 100) return 'Write 0 to 100 mm.';
              setErrors((known) => ({ ...known, slideErrorMm }));
              return null;
            }}
          />
          <ValueField
            label="Grid step"
            kind="length"
            value={stepMm}
            step={10}
            onCommit={(next) => {
              if (next < 10 || next > 1000) return 'A step is 10 to 1000 mm.';
              setStepMm(next);
              return null;
            }}
          />
        </div>
        <Button busy={isAsking} busyLabel="Asking" onClick={() => void start()} data-ask-error-gain>
          Work out the map
        </Button>
        {refusal && <Notice tone="trouble">{refusal}</Notice>}
        {errorGain && (
          <>
            <StudyProgress followed={followed} label="Working out the error gain" />
            {answer && (
              <div className="text-sm" data-error-gain-answer>
                {answer.median === null ? (
                  <p>Nothing is reached at this tool height and direction.</p>
                ) : (
                  <p>
                    The tool may be off by <span className="font-mono">{answer.least?.toFixed(2)}</span> to{' '}
                    <span className="font-mono">{answer.most?.toFixed(2)}</span> mm, on half of the floor by no more
                    than <span className="font-mono font-semibold">{answer.median.toFixed(2)}</span> mm.
                  </p>
                )}
                <Button
                  className="mt-1.5"
                  size="small"
                  aria-pressed={shown === 'errorGain'}
                  onClick={() => store.set({ shown: shown === 'errorGain' ? null : 'errorGain' })}
                >
                  {shown === 'errorGain' ? 'Show the dexterity map' : 'Show on the floor'}
                </Button>
              </div>
            )}
          </>
        )}
        <Quiet>
          At the tool height and direction of the map. To first order, every joint off its own worst way; bending and
          the base’s own errors are not in it.
        </Quiet>
      </div>
    </Section>
  );
}
