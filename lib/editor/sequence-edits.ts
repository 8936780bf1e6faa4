import type { Fixture, Item, SequenceStep } from '@/lib/layout/items';

type Steps = readonly SequenceStep[];

/** What can be added to a sequence, in the order of the work. */
export interface StepChoice {
  /** Unlike any other choice. */
  readonly key: string;
  readonly label: string;
  readonly note: string;
  readonly make: (id: string) => SequenceStep;
}

export function stepChoices(items: readonly Item[]): StepChoice[] {
  const fixtures = items.filter((item): item is Fixture => item.kind === 'fixture');
  const tasks = fixtures.flatMap((fixture) => {
    const common = { fixtureId: fixture.id, motion: 'joint' as const, viaMm: [] };
    return [
      ...fixture.taskPoints.map(({ id: taskPointId, name, order }) => ({
        order,
        choice: choice(`point ${taskPointId}`, name, fixture.name, (id) => ({
          ...common,
          kind: 'point',
          id,
          taskPointId,
          place: null,
        })),
      })),
      ...fixture.taskPatterns.map(({ id: taskPointId, name, order }) => ({
        order,
        choice: choice(`pattern ${taskPointId}`, `${name}, place 1`, `${fixture.name}, pattern`, (id) => ({
          ...common,
          kind: 'point',
          id,
          taskPointId,
          place: 1,
        })),
      })),
      ...fixture.taskPaths.map(({ id: taskPathId, name, order }) => ({
        order,
        choice: choice(`path ${taskPathId}`, name, `${fixture.name}, path`, (id) => ({
          ...common,
          kind: 'path',
          id,
          taskPathId,
        })),
      })),
    ];
  });
  const zones = items.flatMap((item) =>
    item.kind === 'zone' && item.use === 'shared'
      ? (['enter', 'leave'] as const).map((action) =>
          choice(
            `${action} ${item.id}`,
            `${action === 'enter' ? 'Enter' : 'Leave'} ${item.name}`,
            'shared zone',
            (id) => ({
              kind: 'zone',
              id,
              zoneId: item.id,
              action,
            }),
          ),
        )
      : [],
  );
  const waits = (['grip', 'handshake', 'process'] as const).map((cause) =>
    choice(`wait ${cause}`, WAIT_NAMES[cause], 'a wait', (id) => ({
      kind: 'wait',
      id,
      cause,
      name: WAIT_NAMES[cause],
      seconds: 1,
    })),
  );
  return [...tasks.sort((a, b) => a.order - b.order).map(({ choice: made }) => made), ...waits, ...zones];
}

export const WAIT_NAMES = { grip: 'Grip', handshake: 'Handshake', process: 'Process' } as const;

const choice = (key: string, label: string, note: string, make: (id: string) => SequenceStep): StepChoice => ({
  key,
  label,
  note,
  make,
});

/** After the step that is chosen, else at the end. */
export function withStep(steps: Steps, step: SequenceStep, afterId: string | null): SequenceStep[] {
  const at = steps.findIndex(({ id }) => id === afterId);
  return at < 0 ? [...steps, step] : [...steps.slice(0, at + 1), step, ...steps.slice(at + 1)];
}

export const withoutStep = (steps: Steps, stepId: string): SequenceStep[] => steps.filter(({ id }) => id !== stepId);

export const withStepEdited = (steps: Steps, changed: SequenceStep): SequenceStep[] =>
  steps.map((step) => (step.id === changed.id ? changed : step));

/** A step taken out and put at a place of the list, counted without it; places beyond the ends are the ends. */
export function withStepMoved(steps: Steps, stepId: string, to: number): SequenceStep[] {
  const step = steps.find(({ id }) => id === stepId);
  if (!step) return [...steps];
  const rest = withoutStep(steps, stepId);
  const at = Math.min(rest.length, Math.max(0, to));
  return [...rest.slice(0, at), step, ...rest.slice(at)];
}
