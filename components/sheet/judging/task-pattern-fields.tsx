'use client';

import { useBoard } from '@/components/sheet/editor/board-context';
import { ValueField } from '@/components/sheet/panels/value-field';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { edited } from '@/lib/editor/edits';
import { editedTaskPattern, newTaskPattern } from '@/lib/editor/task-edits';
import type { Fixture, TaskPattern } from '@/lib/layout/items';
import { placeCount } from '@/lib/layout/judging/places';
import { AimFields } from './aim-fields';
import { DoneBy } from './done-by';
import { TaskList } from './task-list';
import { useFixtureEdit } from './use-fixture-edit';

/** The trays and pallets of a fixture: rows, columns and layers of places. */
export function TaskPatternFields({ fixture }: { readonly fixture: Fixture }) {
  const { sheet } = useBoard();
  const edit = useFixtureEdit(fixture);
  const add = () => {
    const pattern = newTaskPattern(fixture, crypto.randomUUID());
    const refusal = edit(`Place ${pattern.name}`, (now) =>
      edited(now, { taskPatterns: [...now.taskPatterns, pattern] }),
    );
    if (refusal) return sheet.refuse(refusal);
    sheet.select({ itemIds: [fixture.id], taskPointId: pattern.id });
  };
  return (
    <TaskList
      title="Task patterns"
      empty="None yet. A pattern is a tray or a pallet, judged at every place."
      fixtureId={fixture.id}
      tasks={fixture.taskPatterns}
      locked={fixture.locked}
      figures={({ rows, columns, layers }) => `${rows} × ${columns} × ${layers}`}
      onAdd={add}
      onRename={({ id, name: before }, name) =>
        edit(`Name of ${before}`, (now) => editedTaskPattern(now, id, { name }))
      }
      onRemove={({ id, name }) =>
        edit(`Removal of ${name}`, (now) =>
          edited(now, { taskPatterns: now.taskPatterns.filter((pattern) => pattern.id !== id) }),
        )
      }
    >
      {(pattern) => <OnePattern fixture={fixture} pattern={pattern} />}
    </TaskList>
  );
}

const COUNTS = [
  ['rows', 'Rows'],
  ['columns', 'Columns'],
  ['layers', 'Layers'],
] as const;
const LENGTHS = [
  ['pitchYMm', 'Row pitch'],
  ['pitchXMm', 'Column pitch'],
  ['pitchZMm', 'Layer pitch'],
  ['xMm', 'First, x'],
  ['yMm', 'First, y'],
  ['zMm', 'First, z'],
] as const;

function OnePattern({ fixture, pattern }: { readonly fixture: Fixture; readonly pattern: TaskPattern }) {
  const edit = useFixtureEdit(fixture);
  const set = (label: string, patch: Partial<TaskPattern>) =>
    edit(`${label} of ${pattern.name}`, (now) => editedTaskPattern(now, pattern.id, patch));
  const { locked } = fixture;
  return (
    <>
      <div className="grid grid-cols-3 gap-x-3 gap-y-1.5">
        {COUNTS.map(([key, label]) => (
          <ValueField
            key={key}
            label={label}
            kind="number"
            step={1}
            value={pattern[key]}
            disabled={locked}
            onCommit={(value) =>
              Number.isInteger(value) && value > 0 ? set(label, { [key]: value }) : 'Write a whole number, 1 or more.'
            }
          />
        ))}
        {LENGTHS.map(([key, label]) => (
          <ValueField
            key={key}
            label={label}
            kind="length"
            value={pattern[key]}
            disabled={locked}
            onCommit={(value) => set(label, { [key]: value })}
          />
        ))}
        <AimFields task={pattern} disabled={locked} onEdit={set} />
        <ValueField
          label="Dwell"
          kind="number"
          unit="s"
          step={0.5}
          value={pattern.dwellS}
          disabled={locked}
          onCommit={(dwellS) => (dwellS < 0 ? 'A dwell is 0 s or more.' : set('Dwell', { dwellS }))}
        />
      </div>
      <div className="mt-2 flex items-center justify-between gap-2 text-sm">
        <span>{placeCount(pattern)} places, numbered</span>
        <SegmentedControl
          label="How the places are numbered"
          value={pattern.numbering}
          onValueChange={(numbering) => set('Numbering', { numbering })}
          options={[
            { value: 'rows', label: 'row by row' },
            { value: 'snake', label: 'forth and back' },
          ]}
        />
      </div>
      <DoneBy robotId={pattern.robotId} disabled={locked} onChange={(robotId) => set('Robot', { robotId })} />
    </>
  );
}
