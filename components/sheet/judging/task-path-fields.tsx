'use client';

import { Plus, Trash2 } from 'lucide-react';
import { useBoard } from '@/components/sheet/editor/board-context';
import { ValueField } from '@/components/sheet/panels/value-field';
import { Button } from '@/components/ui/button';
import { Checkbox } from '@/components/ui/checkbox';
import { edited } from '@/lib/editor/edits';
import { editedTaskPath, newTaskPath, withBow, withCornerAfter, withoutCorner } from '@/lib/editor/task-edits';
import type { Fixture, PathCorner, TaskPath } from '@/lib/layout/items';
import { pathLine } from '@/lib/layout/judging/path-line';
import { useUnits } from '@/lib/client/use-units';
import { AimFields } from './aim-fields';
import { DoneBy } from './done-by';
import { TaskList } from './task-list';
import { useFixtureEdit } from './use-fixture-edit';

/** The seams of a fixture: corner after corner, straight or by way of an arc. */
export function TaskPathFields({ fixture }: { readonly fixture: Fixture }) {
  const { sheet } = useBoard();
  const units = useUnits();
  const edit = useFixtureEdit(fixture);
  const add = () => {
    const path = newTaskPath(fixture, crypto.randomUUID());
    const refusal = edit(`Place ${path.name}`, (now) => edited(now, { taskPaths: [...now.taskPaths, path] }));
    if (refusal) return sheet.refuse(refusal);
    sheet.select({ itemIds: [fixture.id], taskPointId: path.id });
  };
  return (
    <TaskList
      title="Task paths"
      empty="None yet. A path is a seam that the tool follows at one speed."
      fixtureId={fixture.id}
      tasks={fixture.taskPaths}
      locked={fixture.locked}
      figures={({ points }) => units.length(pathLine(points, Infinity).lengthMm)}
      onAdd={add}
      onRename={({ id, name: before }, name) => edit(`Name of ${before}`, (now) => editedTaskPath(now, id, { name }))}
      onRemove={({ id, name }) =>
        edit(`Removal of ${name}`, (now) => edited(now, { taskPaths: now.taskPaths.filter((path) => path.id !== id) }))
      }
    >
      {(path) => <OnePath fixture={fixture} path={path} />}
    </TaskList>
  );
}

function OnePath({ fixture, path }: { readonly fixture: Fixture; readonly path: TaskPath }) {
  const edit = useFixtureEdit(fixture);
  const set = (label: string, patch: Partial<TaskPath>) =>
    edit(`${label} of ${path.name}`, (now) => editedTaskPath(now, path.id, patch));
  const { locked } = fixture;
  return (
    <>
      <p className="text-[0.8125rem] text-ink-soft">Corners in the fixture, z over the floor</p>
      <ol className="max-h-72 overflow-y-auto">
        {path.points.map((corner, index) => (
          <Corner
            key={index}
            corner={corner}
            index={index}
            isLeast={path.points.length <= 2}
            locked={locked}
            onChange={(changed) =>
              set('Corner', { points: path.points.map((point, at) => (at === index ? changed : point)) })
            }
            onAdd={() => set('Corner', { points: withCornerAfter(path.points, index) })}
            onRemove={() => set('Corner', { points: withoutCorner(path.points, index) })}
            onBow={(bowed) => set('Arc', { points: withBow(path.points, index, bowed) })}
          />
        ))}
      </ol>
      <div className="mt-2 grid grid-cols-3 gap-x-3 gap-y-1.5">
        <AimFields task={path} disabled={locked} onEdit={set} />
      </div>
      <DoneBy robotId={path.robotId} disabled={locked} onChange={(robotId) => set('Robot', { robotId })} />
    </>
  );
}

const AXES = [
  ['xMm', 'x'],
  ['yMm', 'y'],
  ['zMm', 'z'],
] as const;

interface CornerProps {
  readonly corner: PathCorner;
  readonly index: number;
  readonly isLeast: boolean;
  readonly locked: boolean;
  readonly onChange: (corner: PathCorner) => string | null;
  readonly onAdd: () => void;
  readonly onRemove: () => void;
  readonly onBow: (bowed: boolean) => void;
}

function Corner({ corner, index, isLeast, locked, onChange, onAdd, onRemove, onBow }: CornerProps) {
  const number = index + 1;
  const { arcVia } = corner;
  return (
    <li className="border-b border-hair pb-1">
      <div className="grid grid-cols-[1.25rem_1fr_1fr_1fr_1.75rem_1.75rem] items-end gap-x-2">
        <span className="pb-1 font-mono text-sm text-ink-soft">{number}</span>
        {AXES.map(([key, axis]) => (
          <ValueField
            key={key}
            label={`Corner ${number}, ${axis}`}
            kind="length"
            value={corner[key]}
            disabled={locked}
            onCommit={(value) => onChange({ ...corner, [key]: value })}
          />
        ))}
        <Button
          variant="quiet"
          size="icon"
          disabled={locked}
          aria-label={`Add a corner after corner ${number}`}
          onClick={onAdd}
        >
          <Plus aria-hidden className="size-3.5" />
        </Button>
        <Button
          variant="quiet"
          size="icon"
          disabled={locked || isLeast}
          aria-label={`Remove corner ${number}`}
          onClick={onRemove}
        >
          <Trash2 aria-hidden className="size-3.5" />
        </Button>
      </div>
      {index > 0 && (
        <Checkbox
          className="mt-1"
          label={`An arc leads to corner ${number}`}
          checked={arcVia !== null}
          disabled={locked}
          onCheckedChange={onBow}
        />
      )}
      {arcVia && (
        <div className="ml-5 grid grid-cols-3 gap-x-2">
          {AXES.map(([key, axis]) => (
            <ValueField
              key={key}
              label={`By way of, ${axis}`}
              kind="length"
              value={arcVia[key]}
              disabled={locked}
              onCommit={(value) => onChange({ ...corner, arcVia: { ...arcVia, [key]: value } })}
            />
          ))}
        </div>
      )}
    </li>
  );
}
