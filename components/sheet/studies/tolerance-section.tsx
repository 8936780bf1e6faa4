'use client';

import { useState } from 'react';
import { useBoardSettings } from '@/components/sheet/editor/board-context';
import { ValueField } from '@/components/sheet/panels/value-field';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { useStudy } from '@/lib/client/use-study';
import type { ToleranceAnswer } from '@/lib/layout/standing/answer';
import { toleranceOfRobot, type NamedWork } from '@/lib/layout/standing/ask';
import { Quiet, Section } from './section';
import { StudyProgress } from './study-progress';
import { useStudyStore, useStudyView } from './study-store';
import { useAsking } from './use-asking';
import { useStudySubjects } from './use-study-subjects';

/** How wrong may a base be set down? Errors are drawn by lot, and the share of trials counts in which all verdicts hold. */
export function ToleranceSection() {
  const { robots, workOf } = useStudySubjects();
  const { wrist } = useBoardSettings();
  const store = useStudyStore();
  const { tolerance } = useStudyView();
  const followed = useStudy(tolerance?.studyId ?? null);
  const { isAsking, refusal, ask, refuse } = useAsking();
  const [robotId, setRobotId] = useState<string | null>(null);
  const [errors, setErrors] = useState({ placeMm: 10, turnDeg: 0.5, levelDeg: 0.2 });
  const [trials, setTrials] = useState(500);
  const subject = robots.find(({ robot }) => robot.id === robotId) ?? robots[0];
  if (!subject) return null;

  const start = async () => {
    const { robot } = subject;
    const work = workOf(robot.id);
    if (work.length === 0) return refuse(`${robot.name} has no task point. Give it one first.`);
    const question = toleranceOfRobot(robot, work, { wrist, ...errors, trials });
    const studyId = await ask(question);
    if (studyId) store.set({ tolerance: { studyId, question, work, robotId: robot.id, moverId: robot.id } });
  };
  const error = (key: keyof typeof errors, most: number) => (value: number) => {
    if (value < 0 || value > most) return `Write 0 to ${most}.`;
    setErrors((known) => ({ ...known, [key]: value }));
    return null;
  };
  const answer = followed.study?.answer?.study === 'tolerance' ? followed.study.answer : null;
  return (
    <Section title="Installation tolerance">
      <div className="grid gap-2">
        <Field label="Base of" inline className="grid-cols-[4.5rem_minmax(0,1fr)]!">
          <Select
            className="min-h-7 text-sm"
            value={subject.robot.id}
            onValueChange={setRobotId}
            options={robots.map(({ robot: { id, name } }) => ({ value: id, label: name }))}
          />
        </Field>
        <div className="grid grid-cols-4 gap-x-3">
          <ValueField label="Place ±" kind="length" value={errors.placeMm} step={1} onCommit={error('placeMm', 1000)} />
          <ValueField label="Turn ±" kind="angle" value={errors.turnDeg} step={0.1} onCommit={error('turnDeg', 45)} />
          <ValueField
            label="Level ±"
            kind="angle"
            value={errors.levelDeg}
            step={0.1}
            onCommit={error('levelDeg', 45)}
          />
          <ValueField
            label="Trials"
            kind="number"
            value={trials}
            step={100}
            onCommit={(value) => {
              if (!Number.isInteger(value) || value < 10 || value > 20_000) return 'Write 10 to 20,000.';
              setTrials(value);
              return null;
            }}
          />
        </div>
        <Button busy={isAsking} busyLabel="Asking" onClick={() => void start()} data-ask-tolerance>
          Set it down by lot
        </Button>
        {refusal && <Notice tone="trouble">{refusal}</Notice>}
        {tolerance && (
          <>
            <StudyProgress followed={followed} label="Setting the base down" />
            {answer && <ToleranceResult answer={answer} work={tolerance.work} />}
          </>
        )}
        <Quiet>
          Each trial sets the base down off by an error drawn evenly from these ranges. A point keeps its verdict where
          it is still reached, still fast enough and in no worse band.
        </Quiet>
      </div>
    </Section>
  );
}

function ToleranceResult({ answer, work }: { readonly answer: ToleranceAnswer; readonly work: readonly NamedWork[] }) {
  const { share, interval, trials, kept, keptByPoint } = answer;
  const percent = (value: number): string => `${(100 * value).toFixed(1)} %`;
  const losing = work
    .map(({ name }, index) => ({ name, index, kept: keptByPoint[index] }))
    .filter((row) => row.kept !== null && row.kept < trials)
    .sort((one, other) => Number(one.kept) - Number(other.kept));
  const outCount = keptByPoint.filter((count) => count === null).length;
  return (
    <div data-tolerance-answer={share} className="text-sm">
      <p className="text-[0.9375rem]">
        All verdicts hold in <span className="font-mono font-semibold">{percent(share)}</span> of {trials} trials (
        {kept}); the true share lies within {percent(interval[0])} and {percent(interval[1])} with 95 %.
      </p>
      {losing.length > 0 && (
        <ul className="mt-1">
          {losing.slice(0, 8).map((row) => (
            <li key={row.index} className="flex justify-between gap-3 border-t border-hair">
              <span className="truncate">{row.name}</span>
              <span className="font-mono">{percent(Number(row.kept) / trials)}</span>
            </li>
          ))}
        </ul>
      )}
      {outCount > 0 && (
        <p className="mt-1 text-red">
          {outCount === 1 ? 'One point is' : `${outCount} points are`} not reached as drawn and left out.
        </p>
      )}
    </div>
  );
}
