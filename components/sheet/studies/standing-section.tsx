'use client';

import { useState } from 'react';
import { useBoardSettings } from '@/components/sheet/editor/board-context';
import { ValueField } from '@/components/sheet/panels/value-field';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import { robotSizes } from '@/lib/layout/robot-sticks';
import { standingOfFixture, standingOfRobot } from '@/lib/layout/standing/ask';
import { useStudy } from '@/lib/client/use-study';
import { parseRisers } from './parse-risers';
import { Quiet, Section } from './section';
import { StandingResult } from './standing-result';
import { StudyProgress } from './study-progress';
import { useStudyStore, useStudyView } from './study-store';
import { useAsking } from './use-asking';
import { useStudySubjects } from './use-study-subjects';

const TURNS = [
  { value: '1', label: 'As drawn' },
  { value: '4', label: 'Every 90°' },
  { value: '8', label: 'Every 45°' },
  { value: '12', label: 'Every 30°' },
  { value: '24', label: 'Every 15°' },
] as const;

/** Where could a base or a fixture stand? The question, its progress and its answer. */
export function StandingSection() {
  const { items, robots, fixtures, workOf } = useStudySubjects();
  const settings = useBoardSettings();
  const store = useStudyStore();
  const { standing } = useStudyView();
  const followed = useStudy(standing?.studyId ?? null);
  const { isAsking, refusal, ask, refuse } = useAsking();
  const [moverId, setMoverId] = useState<string | null>(null);
  const [robotId, setRobotId] = useState<string | null>(null);
  const [stepMm, setStepMm] = useState(100);
  const [turns, setTurns] = useState<(typeof TURNS)[number]['value']>('8');
  const [risers, setRisers] = useState('');

  const mover = [...robots.map(({ robot }) => robot), ...fixtures].find(({ id }) => id === moverId) ?? robots[0]?.robot;
  const subject =
    robots.find(({ robot }) => robot.id === (mover?.kind === 'robot' ? mover.id : robotId)) ?? robots[0] ?? null;
  if (!mover || !subject) {
    return (
      <Section title="Where could it stand?">
        <Quiet>
          Place a robot, and a fixture with task points. The study then looks for the places that suit the work.
        </Quiet>
      </Section>
    );
  }

  const start = async () => {
    const { robot, arm } = subject;
    const heights = parseRisers(risers, robot.riserMm);
    if (typeof heights === 'string') return refuse(heights);
    const halfPlateMm = robotSizes(arm.reachMm).baseRadiusMm;
    const all = workOf(robot.id);
    const work = mover.kind === 'fixture' ? all.filter(({ fixtureId }) => fixtureId === mover.id) : all;
    if (work.length === 0) {
      return refuse(
        `${robot.name} has no task point${mover.kind === 'fixture' ? ` on ${mover.name}` : ''}. Give it one first.`,
      );
    }
    const options = { wrist: settings.wrist, stepMm, turns: Number(turns), risersMm: heights, halfPlateMm };
    const question =
      mover.kind === 'fixture'
        ? standingOfFixture(items, mover, robot, arm.definition, work, options)
        : standingOfRobot(items, robot, arm.definition, work, options);
    const studyId = await ask(question);
    if (studyId === null) return;
    store.set({
      standing: { studyId, question, work, robotId: robot.id, moverId: mover.id },
      shown: 'standing',
    });
  };

  return (
    <Section title="Where could it stand?">
      <div className="grid gap-2">
        <Field label="Move" inline className="grid-cols-[4.5rem_minmax(0,1fr)]!">
          <Select
            className="min-h-7 text-sm"
            value={mover.id}
            onValueChange={setMoverId}
            options={[...robots.map(({ robot }) => robot), ...fixtures].map(({ id, name }) => ({
              value: id,
              label: name,
            }))}
          />
        </Field>
        {mover.kind === 'fixture' && (
          <Field label="For" inline className="grid-cols-[4.5rem_minmax(0,1fr)]!">
            <Select
              className="min-h-7 text-sm"
              value={subject.robot.id}
              onValueChange={setRobotId}
              options={robots.map(({ robot: { id, name } }) => ({ value: id, label: name }))}
            />
          </Field>
        )}
        <div className="grid grid-cols-2 gap-x-3">
          <ValueField
            label="Step"
            kind="length"
            value={stepMm}
            step={10}
            onCommit={(next) => {
              if (next < 5 || next > 1000) return 'A step is 5 to 1000 mm.';
              setStepMm(next);
              return null;
            }}
          />
          <Field label="Turns">
            <Select className="min-h-7 text-sm" value={turns} onValueChange={setTurns} options={TURNS} />
          </Field>
        </div>
        {mover.kind === 'robot' && (
          <Field label="Riser heights, mm" hint={`Empty: ${subject.robot.riserMm} as drawn. Several, with commas.`}>
            <TextInput
              className="min-h-7 text-sm"
              inputMode="text"
              value={risers}
              onChange={(event) => setRisers(event.target.value)}
              placeholder={String(subject.robot.riserMm)}
            />
          </Field>
        )}
        <Button variant="action" busy={isAsking} busyLabel="Asking" onClick={() => void start()} data-ask-standing>
          Look for places
        </Button>
        {refusal && <Notice tone="trouble">{refusal}</Notice>}
        {standing && (
          <>
            <StudyProgress followed={followed} label="Trying places" />
            {followed.study?.answer?.study === 'standing' && (
              <StandingResult asked={standing} answer={followed.study.answer} />
            )}
          </>
        )}
      </div>
    </Section>
  );
}
