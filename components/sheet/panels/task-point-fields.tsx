'use client';

import { ArrowDown, ArrowUp, Plus, Trash2 } from 'lucide-react';
import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { Button } from '@/components/ui/button';
import { AimFields } from '@/components/sheet/judging/aim-fields';
import { classNames } from '@/components/ui/class-names';
import { editedTaskPoint, reorderedTaskPoint, withoutTaskPoint } from '@/lib/editor/edits';
import { placeTaskPointInView } from '@/lib/editor/place-in-view';
import { printed } from '@/lib/editor/measure-text';
import type { Fixture, TaskPoint } from '@/lib/layout/items';
import { DoneBy } from '@/components/sheet/judging/done-by';
import { TaskPathFields } from '@/components/sheet/judging/task-path-fields';
import { TaskPatternFields } from '@/components/sheet/judging/task-pattern-fields';
import { NameField } from './name-field';
import { ValueField } from './value-field';

/** The task points of a fixture: the list in the order of the work, and the typed values of the one that is chosen. */
export function TaskPointFields({ fixture }: { readonly fixture: Fixture }) {
  const { sheet } = useBoard();
  const chosenId = useBoardSheet((state) => state.selection.taskPointId);
  const points = [...fixture.taskPoints].sort((one, other) => one.order - other.order);
  const chosen = points.find(({ id }) => id === chosenId);
  const add = () => {
    const { items, selection } = sheet.getState();
    const placed = placeTaskPointInView(items, selection, { xMm: fixture.xMm, yMm: fixture.yMm }, () =>
      crypto.randomUUID(),
    );
    if (placed) sheet.commit(placed.label, placed.changes, placed.selection);
  };
  return (
    <div className="mt-3">
      <div className="flex items-center justify-between">
        <h3 className="text-[0.8125rem] font-medium text-ink-soft">Task points</h3>
        <Button variant="quiet" size="small" onClick={add} disabled={fixture.locked} className="-mr-2.5">
          <Plus aria-hidden className="size-4" /> Add
        </Button>
      </div>
      {points.length === 0 && <p className="text-sm text-ink-soft">None yet. Add one, or place it with the tool.</p>}
      <ol className={points.length > 0 ? 'border-t border-hair' : undefined}>
        {points.map((point) => (
          <li key={point.id} className="border-b border-hair">
            <button
              type="button"
              aria-pressed={point.id === chosenId}
              onClick={() =>
                sheet.select({ itemIds: [fixture.id], taskPointId: point.id === chosenId ? null : point.id })
              }
              className={classNames(
                'flex min-h-7 w-full items-center justify-between gap-2 px-1.5 text-left text-sm hover:bg-petrol-wash focus-visible:-outline-offset-2 pointer-coarse:min-h-11',
                point.id === chosenId && 'bg-petrol-wash font-medium',
              )}
            >
              <span className="truncate">{point.name}</span>
              <span className="font-mono text-[0.8125rem] whitespace-nowrap text-ink-soft">
                {printed(point.xMm, 0)} {printed(point.yMm, 0)} z {printed(point.zMm, 0)}
              </span>
            </button>
            {chosen?.id === point.id && <OnePoint fixture={fixture} point={point} />}
          </li>
        ))}
      </ol>
      <TaskPathFields fixture={fixture} />
      <TaskPatternFields fixture={fixture} />
    </div>
  );
}

function OnePoint({ fixture, point }: { readonly fixture: Fixture; readonly point: TaskPoint }) {
  const { sheet } = useBoard();
  const put = (label: string, after: Fixture) => {
    const before = sheet.getState().items.get(fixture.id) ?? null;
    sheet.commit(`${label} of ${point.name}`, [{ itemId: fixture.id, before, after }]);
  };
  const edit = (label: string, patch: Partial<TaskPoint>): string | null => {
    const now = sheet.getState().items.get(fixture.id);
    const result = editedTaskPoint(now?.kind === 'fixture' ? now : fixture, point.id, patch);
    if (!result.ok) return result.message;
    put(label, result.value);
    return null;
  };
  const field = (label: string, key: 'xMm' | 'yMm' | 'zMm') => (
    <ValueField label={label} kind="length" value={point[key]} onCommit={(value) => edit(label, { [key]: value })} />
  );
  return (
    <div className="bg-petrol-wash px-1.5 pb-2">
      <div className="flex items-center">
        <NameField label="Name of the task point" value={point.name} onCommit={(name) => edit('Name', { name })} />
        <Button
          variant="quiet"
          size="icon"
          aria-label={`Move ${point.name} up`}
          onClick={() => put('Order', reorderedTaskPoint(fixture, point.id, -1))}
        >
          <ArrowUp aria-hidden className="size-3.5" />
        </Button>
        <Button
          variant="quiet"
          size="icon"
          aria-label={`Move ${point.name} down`}
          onClick={() => put('Order', reorderedTaskPoint(fixture, point.id, 1))}
        >
          <ArrowDown aria-hidden className="size-3.5" />
        </Button>
        <Button
          variant="quiet"
          size="icon"
          aria-label={`Delete ${point.name}`}
          onClick={() => put('Removal', withoutTaskPoint(fixture, point.id))}
        >
          <Trash2 aria-hidden className="size-3.5" />
        </Button>
      </div>
      <div className="grid grid-cols-3 gap-x-3 gap-y-1.5">
        {field('x in fixture', 'xMm')}
        {field('y in fixture', 'yMm')}
        {field('z over floor', 'zMm')}
        <ValueField
          label="Dwell"
          kind="number"
          unit="s"
          step={0.5}
          value={point.dwellS}
          onCommit={(dwellS) => (dwellS < 0 ? 'A dwell is 0 s or more.' : edit('Dwell', { dwellS }))}
        />
        <AimFields task={point} onEdit={edit} />
      </div>
      <DoneBy robotId={point.robotId} disabled={fixture.locked} onChange={(robotId) => edit('Robot', { robotId })} />
    </div>
  );
}
