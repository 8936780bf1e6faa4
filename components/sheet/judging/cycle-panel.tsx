'use client';

import { useMemo, useState } from 'react';
import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { useItemEdit } from '@/components/sheet/panels/use-item-edit';
import { ValueField } from '@/components/sheet/panels/value-field';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { inOrder } from '@/lib/editor/order';
import type { Robot } from '@/lib/layout/items';
import type { CycleEstimate } from '@/lib/layout/cycle/estimate';
import type { CellCycles } from '@/lib/layout/cycle/cycle-judge';
import { seconds } from './seconds';
import { SequenceEditor } from './sequence-editor';
import { TimeChart } from './time-chart';
import { useCellCycle } from './use-cell-cycle';

/** The robots' cycles: one robot's steps to edit, what they take, and all robots against one another. */
export function CyclePanel() {
  const items = useBoardSheet((state) => state.items);
  const { itemIds } = useBoardSheet((state) => state.selection);
  const robots = useMemo(() => inOrder(items).filter((item): item is Robot => item.kind === 'robot'), [items]);
  const [pickedId, pick] = useState<string | null>(null);
  const cycles = useCellCycle();
  // A robot that is chosen on the sheet is the one that is meant.
  const onSheet = robots.find(({ id }) => itemIds.includes(id));
  const robot = onSheet ?? robots.find(({ id }) => id === pickedId) ?? robots[0];
  if (!robot)
    return <p className="px-3.5 py-3 text-sm text-ink-soft">No robot yet. Place one; its steps are listed here.</p>;
  return (
    <section aria-labelledby="cycle-title" className="pb-3">
      <div className="border-b border-rule px-3.5 pt-3 pb-3">
        <h2 id="cycle-title" className="text-[0.8125rem] font-medium text-ink-soft">
          Cycle, estimated
        </h2>
        <RobotHead key={robot.id} robot={robot} robots={robots} cycles={cycles} onPick={(id) => pick(id)} />
      </div>
      <SequenceEditor
        key={`steps ${robot.id}`}
        robot={robot}
        estimate={cycles.estimates.find(({ robotId }) => robotId === robot.id) ?? null}
      />
      <TimeChart cell={cycles.cell} />
      <p className="px-3.5 pt-2.5 text-[0.8125rem] leading-4.5 text-ink-soft">
        An estimate from joint speeds and accelerations: moves start and end at rest, corners are not rounded, and what
        a controller adds is not in it. A measured cycle can be longer.
      </p>
    </section>
  );
}

interface RobotHeadProps {
  readonly robot: Robot;
  readonly robots: readonly Robot[];
  readonly cycles: CellCycles;
  readonly onPick: (robotId: string) => void;
}

function RobotHead({ robot, robots, cycles, onPick }: RobotHeadProps) {
  const { sheet } = useBoard();
  const edit = useItemEdit(robot);
  const estimate = cycles.estimates.find(({ robotId }) => robotId === robot.id) ?? null;
  const times = cycles.cell.robots.find(({ robotId }) => robotId === robot.id) ?? null;
  return (
    <>
      <div className="mt-1 grid grid-cols-[minmax(0,1fr)_6.5rem] items-end gap-x-4">
        <Field label="Robot" inline className="grid-cols-[3rem_minmax(0,1fr)]!">
          <Select
            className="min-h-7 text-sm"
            value={robot.id}
            onValueChange={(id) => {
              onPick(id);
              sheet.select({ itemIds: [id], taskPointId: null });
            }}
            options={robots.map(({ id, name, sequence }) => ({
              value: id,
              label: `${name}, ${sequence.length} ${sequence.length === 1 ? 'step' : 'steps'}`,
            }))}
          />
        </Field>
        <ValueField
          label="Target, 0 for none"
          kind="number"
          unit="s"
          step={0.5}
          value={robot.targetCycleS ?? 0}
          disabled={robot.locked}
          onCommit={(target) =>
            target < 0
              ? 'Write a time above zero, or 0 for none.'
              : edit('Target cycle', { targetCycleS: target === 0 ? null : target })
          }
        />
      </div>
      {estimate && times && <Result estimate={estimate} queuedS={times.queuedS} endS={times.endS} />}
    </>
  );
}

function Result({
  estimate,
  queuedS,
  endS,
}: {
  readonly estimate: CycleEstimate;
  readonly queuedS: number;
  readonly endS: number;
}) {
  const { targetS, problems } = estimate;
  const marginS = targetS === null ? null : targetS - endS;
  return (
    <>
      <p data-cycle className="mt-2">
        About <span className="font-mono text-lg">{seconds(endS)}</span> s a cycle
        {queuedS > 0 && `, ${seconds(queuedS)} s of it waiting for a zone`}
        {marginS !== null && (
          <span className={marginS < 0 ? 'text-red' : 'text-green'}>
            {`, ${seconds(Math.abs(marginS))} s ${marginS < 0 ? 'over' : 'within'} the ${seconds(targetS!)} s wanted`}
          </span>
        )}
        .
      </p>
      {problems.length > 0 && (
        <ul role="status" className="mt-1 text-sm text-red">
          {problems.map(({ stepId, number, label, message }) => (
            <li key={`${stepId} ${message}`}>
              Step {number}, {label}: {message}
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
