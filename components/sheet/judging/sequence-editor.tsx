'use client';

import { useMemo, useState } from 'react';
import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { useItemEdit } from '@/components/sheet/panels/use-item-edit';
import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { inOrder } from '@/lib/editor/order';
import { stepChoices, withoutStep, withStep, withStepEdited, withStepMoved } from '@/lib/editor/sequence-edits';
import type { Robot, SequenceStep } from '@/lib/layout/items';
import type { CycleEstimate } from '@/lib/layout/cycle/estimate';
import { resolveSteps } from '@/lib/layout/cycle/resolve-steps';
import { StepRow } from './step-row';

interface SequenceEditorProps {
  readonly robot: Robot;
  readonly estimate: CycleEstimate | null;
}

/** The steps of a robot in their order: added from the sheet's work, dragged or moved by keys, each with its own settings. */
export function SequenceEditor({ robot, estimate }: SequenceEditorProps) {
  const { sheet } = useBoard();
  const items = useBoardSheet((state) => state.items);
  const edit = useItemEdit(robot);
  const [openId, open] = useState<string | null>(null);
  const [draggedId, drag] = useState<string | null>(null);
  const ordered = useMemo(() => inOrder(items), [items]);
  const choices = useMemo(() => stepChoices(ordered), [ordered]);
  const labels = useMemo(
    () => resolveSteps(robot.sequence, ordered).map(({ label }) => label),
    [robot.sequence, ordered],
  );
  const timed = new Map(estimate?.steps.map((step) => [step.stepId, step]));
  const faulty = new Set(estimate?.problems.map(({ stepId }) => stepId));

  const put = (what: string, sequence: SequenceStep[]) => {
    const refusal = edit(what, { sequence });
    if (refusal) sheet.refuse(refusal);
    return refusal;
  };
  const choose = (step: SequenceStep) => {
    open(step.id === openId ? null : step.id);
    if (step.kind === 'wait' || step.kind === 'zone' || step.id === openId) return;
    const taskPointId = step.kind === 'path' ? step.taskPathId : step.taskPointId;
    if (items.has(step.fixtureId)) sheet.select({ itemIds: [robot.id, step.fixtureId], taskPointId });
  };
  const move = (step: SequenceStep, to: number, label: string) => {
    if (to < 0 || to >= robot.sequence.length) return;
    if (!put('Order of the cycle', withStepMoved(robot.sequence, step.id, to)))
      sheet.say(`${label} is step ${to + 1} of ${robot.sequence.length}.`);
  };
  const { sequence, locked } = robot;
  return (
    <div className="border-b border-rule px-3.5 pt-2 pb-3">
      <h3 className="text-[0.8125rem] font-medium text-ink-soft">Steps of {robot.name}</h3>
      {sequence.length === 0 ? (
        <p className="mt-1 text-sm text-ink-soft">
          None yet. Add the task points that {robot.name} goes to, in their order; the cycle is timed as you go.
        </p>
      ) : (
        <ol aria-label={`Steps of ${robot.name}`} className="mt-1 border-t border-hair">
          {sequence.map((step, index) => (
            <StepRow
              key={step.id}
              step={step}
              index={index}
              count={sequence.length}
              label={labels[index]}
              timed={timed.get(step.id) ?? null}
              isFaulty={faulty.has(step.id)}
              isOpen={step.id === openId}
              locked={locked}
              zones={ordered.filter(({ kind }) => kind === 'zone')}
              onOpen={() => choose(step)}
              onMove={(to) => move(step, to, labels[index])}
              onRemove={() => put('Steps of the cycle', withoutStep(sequence, step.id))}
              onChange={(changed) => edit('Step of the cycle', { sequence: withStepEdited(sequence, changed) })}
              isDropTarget={draggedId !== null && draggedId !== step.id}
              onDrag={(isHeld) => drag(isHeld ? step.id : null)}
              onDrop={() => {
                const dragged = sequence.findIndex(({ id }) => id === draggedId);
                if (dragged >= 0) move(sequence[dragged], index, labels[dragged]);
                drag(null);
              }}
            />
          ))}
        </ol>
      )}
      <Field label="Add a step" inline className="mt-2 grid-cols-[5rem_minmax(0,1fr)]!">
        <Select
          // The field goes back to its question after each step that is added.
          key={sequence.length}
          className="min-h-7 text-sm"
          value={undefined}
          placeholder={openId ? 'after the open step' : 'at the end'}
          disabled={locked}
          onValueChange={(key) => {
            const made = choices.find((choice) => choice.key === key)?.make(crypto.randomUUID());
            if (!made || put('Steps of the cycle', withStep(sequence, made, openId))) return;
            open(openId === null ? null : made.id);
          }}
          options={choices.map(({ key, label, note }) => ({ value: key, label, note }))}
        />
      </Field>
    </div>
  );
}
