'use client';

import { Plus, Trash2 } from 'lucide-react';
import { NameField } from '@/components/sheet/panels/name-field';
import { ValueField } from '@/components/sheet/panels/value-field';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Select } from '@/components/ui/select';
import { useBoardSheet } from '@/components/sheet/editor/board-context';
import { WAIT_NAMES } from '@/lib/editor/sequence-edits';
import { tidy } from '@/lib/editor/snapping';
import type { Item, SequenceStep } from '@/lib/layout/items';

interface StepFieldsProps<S extends SequenceStep = SequenceStep> {
  readonly step: S;
  readonly locked: boolean;
  readonly onChange: (step: SequenceStep) => string | null;
}

/** The settings of one step. */
export function StepFields({ step, locked, zones, onChange }: StepFieldsProps & { readonly zones: readonly Item[] }) {
  switch (step.kind) {
    case 'point':
    case 'path':
      return <MoveFields step={step} locked={locked} onChange={onChange} />;
    case 'wait':
      return <WaitFields step={step} locked={locked} onChange={onChange} />;
    case 'zone':
      return (
        <>
          <Field label="Zone" inline className="grid-cols-[4rem_minmax(0,1fr)]!">
            <Select
              className="min-h-7 text-sm"
              value={zones.some(({ id }) => id === step.zoneId) ? step.zoneId : undefined}
              placeholder="It is gone: choose another"
              disabled={locked}
              onValueChange={(zoneId) => onChange({ ...step, zoneId })}
              options={zones.map(({ id, name }) => ({ value: id, label: name }))}
            />
          </Field>
          <SegmentedControl
            className="mt-1.5"
            label="What the robot does"
            value={step.action}
            disabled={locked}
            onValueChange={(action) => onChange({ ...step, action })}
            options={[
              { value: 'enter', label: 'enters it' },
              { value: 'leave', label: 'leaves it' },
            ]}
          />
        </>
      );
  }
}

function WaitFields({ step, locked, onChange }: StepFieldsProps<Extract<SequenceStep, { kind: 'wait' }>>) {
  return (
    <>
      <NameField
        label="Name of the wait"
        value={step.name}
        disabled={locked}
        onCommit={(name) => onChange({ ...step, name })}
      />
      <div className="grid grid-cols-[minmax(0,1fr)_6rem] items-end gap-x-4">
        <Field label="Cause" inline className="grid-cols-[3rem_minmax(0,1fr)]!">
          <Select
            className="min-h-7 text-sm"
            value={step.cause}
            disabled={locked}
            onValueChange={(cause) => onChange({ ...step, cause })}
            options={(['grip', 'handshake', 'process'] as const).map((cause) => ({
              value: cause,
              label: WAIT_NAMES[cause],
            }))}
          />
        </Field>
        <ValueField
          label="Takes"
          kind="number"
          unit="s"
          step={0.1}
          value={step.seconds}
          disabled={locked}
          onCommit={(value) => (value < 0 ? 'A time is 0 s or more.' : onChange({ ...step, seconds: value }))}
        />
      </div>
    </>
  );
}

const AXES = ['x', 'y', 'z'] as const;

function MoveFields({ step, locked, onChange }: StepFieldsProps<Extract<SequenceStep, { kind: 'point' | 'path' }>>) {
  const fixture = useBoardSheet((state) => state.items).get(step.fixtureId);
  const isPattern =
    step.kind === 'point' &&
    (step.place !== null ||
      (fixture?.kind === 'fixture' && fixture.taskPatterns.some(({ id }) => id === step.taskPointId)));
  const addVia = () => {
    const [xMm, yMm] = fixture ? [fixture.xMm, fixture.yMm] : [0, 0];
    const zMm = fixture?.kind === 'fixture' ? fixture.zToMm + 200 : 1000;
    const last = step.viaMm[step.viaMm.length - 1] ?? [tidy(xMm), tidy(yMm), tidy(zMm)];
    onChange({ ...step, viaMm: [...step.viaMm, last] });
  };
  return (
    <>
      <div className="flex items-end justify-between gap-3">
        <SegmentedControl
          label="How it gets there"
          value={step.motion}
          disabled={locked}
          onValueChange={(motion) => onChange({ ...step, motion })}
          options={[
            { value: 'joint', label: 'joint move' },
            { value: 'straight', label: 'straight' },
          ]}
        />
        {isPattern && step.kind === 'point' && (
          <ValueField
            className="w-20"
            label="Place"
            kind="number"
            step={1}
            value={step.place ?? 0}
            disabled={locked}
            onCommit={(place) =>
              Number.isInteger(place) && place >= 1 ? onChange({ ...step, place }) : 'Write a whole number, 1 or more.'
            }
          />
        )}
      </div>
      {step.motion === 'straight' && (
        <div className="mt-1.5">
          <div className="flex items-center justify-between">
            <p className="text-[0.8125rem] text-ink-soft">By way of, on the floor</p>
            <Button variant="quiet" size="small" disabled={locked} onClick={addVia} className="-mr-2">
              <Plus aria-hidden className="size-4" /> Add a point on the way
            </Button>
          </div>
          <ol>
            {step.viaMm.map((via, index) => (
              <li key={index} className="grid grid-cols-[1fr_1fr_1fr_1.75rem] items-end gap-x-2">
                {AXES.map((axis, at) => (
                  <ValueField
                    key={axis}
                    label={`Way point ${index + 1}, ${axis}`}
                    kind="length"
                    value={via[at]}
                    disabled={locked}
                    onCommit={(value) =>
                      onChange({
                        ...step,
                        viaMm: step.viaMm.map((point, k): [number, number, number] =>
                          k !== index
                            ? point
                            : [at === 0 ? value : point[0], at === 1 ? value : point[1], at === 2 ? value : point[2]],
                        ),
                      })
                    }
                  />
                ))}
                <Button
                  variant="quiet"
                  size="icon"
                  disabled={locked}
                  aria-label={`Remove way point ${index + 1}`}
                  onClick={() => onChange({ ...step, viaMm: step.viaMm.filter((_, k) => k !== index) })}
                >
                  <Trash2 aria-hidden className="size-3.5" />
                </Button>
              </li>
            ))}
          </ol>
        </div>
      )}
    </>
  );
}
