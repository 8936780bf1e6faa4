'use client';

import { Plus, Trash2 } from 'lucide-react';
import type { ReactNode } from 'react';
import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { NameField } from '@/components/sheet/panels/name-field';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';

interface Task {
  readonly id: string;
  readonly name: string;
}

interface TaskListProps<T extends Task> {
  readonly title: string;
  readonly empty: string;
  readonly fixtureId: string;
  readonly tasks: readonly T[];
  readonly locked: boolean;
  /** What stands to the right of a name. */
  readonly figures: (task: T) => string;
  readonly onAdd: () => void;
  readonly onRename: (task: T, name: string) => string | null;
  readonly onRemove: (task: T) => void;
  /** The typed values of the one that is chosen. */
  readonly children: (task: T) => ReactNode;
}

/** The paths or the patterns of a fixture: a list, and the fields of the one that is chosen. */
export function TaskList<T extends Task>(props: TaskListProps<T>) {
  const { title, empty, fixtureId, tasks, locked, figures } = props;
  const { sheet } = useBoard();
  const chosenId = useBoardSheet((state) => state.selection.taskPointId);
  return (
    <div className="mt-3">
      <div className="flex items-center justify-between">
        <h3 className="text-[0.8125rem] font-medium text-ink-soft">{title}</h3>
        <Button variant="quiet" size="small" onClick={props.onAdd} disabled={locked} className="-mr-2.5">
          <Plus aria-hidden className="size-4" /> Add<span className="sr-only"> to {title.toLowerCase()}</span>
        </Button>
      </div>
      {tasks.length === 0 && <p className="text-sm text-ink-soft">{empty}</p>}
      <ol aria-label={title} className={tasks.length > 0 ? 'border-t border-hair' : undefined}>
        {tasks.map((task) => {
          const isChosen = task.id === chosenId;
          return (
            <li key={task.id} className="border-b border-hair">
              <button
                type="button"
                aria-pressed={isChosen}
                onClick={() => sheet.select({ itemIds: [fixtureId], taskPointId: isChosen ? null : task.id })}
                className={classNames(
                  'flex min-h-7 w-full items-center justify-between gap-2 px-1.5 text-left text-sm hover:bg-petrol-wash focus-visible:-outline-offset-2 pointer-coarse:min-h-11',
                  isChosen && 'bg-petrol-wash font-medium',
                )}
              >
                <span className="truncate">{task.name}</span>
                <span className="font-mono text-[0.8125rem] whitespace-nowrap text-ink-soft">{figures(task)}</span>
              </button>
              {isChosen && (
                <div className="bg-petrol-wash px-1.5 pb-2">
                  <div className="flex items-center">
                    <NameField
                      label={`Name in ${title.toLowerCase()}`}
                      value={task.name}
                      disabled={locked}
                      onCommit={(name) => props.onRename(task, name)}
                    />
                    <Button
                      variant="quiet"
                      size="icon"
                      disabled={locked}
                      aria-label={`Delete ${task.name}`}
                      onClick={() => props.onRemove(task)}
                    >
                      <Trash2 aria-hidden className="size-3.5" />
                    </Button>
                  </div>
                  {props.children(task)}
                </div>
              )}
            </li>
          );
        })}
      </ol>
    </div>
  );
}
