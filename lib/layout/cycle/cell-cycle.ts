import type { Robot } from '../items';
import type { CycleEstimate } from './estimate';

/** One bar of the time chart. */
export interface ChartBar {
  readonly stepId: string;
  readonly kind: 'joint' | 'straight' | 'path' | 'hold' | 'queue';
  readonly label: string;
  readonly fromS: number;
  readonly toS: number;
}

export interface RobotTimes {
  readonly robotId: string;
  readonly robotName: string;
  readonly bars: readonly ChartBar[];
  /** Waiting for zones. */
  readonly queuedS: number;
  /** When its cycle is done. */
  readonly endS: number;
  readonly targetS: number | null;
  readonly marginS: number | null;
}

/** Who is in a shared zone, and when. */
export interface ZoneStay {
  readonly zoneId: string;
  readonly robotId: string;
  readonly fromS: number;
  readonly toS: number;
}

export interface CellCycle {
  readonly robots: readonly RobotTimes[];
  readonly stays: readonly ZoneStay[];
  /** When the last robot is done. */
  readonly endS: number;
  /** Steps that do not fit together: a zone never left, robots that wait for one another for ever. */
  readonly problems: readonly string[];
}

interface Task {
  readonly stepId: string;
  readonly kind: ChartBar['kind'] | 'enter' | 'leave' | 'end';
  readonly label: string;
  readonly seconds: number;
  readonly zoneId: string | null;
}

interface Runner {
  readonly estimate: CycleEstimate;
  readonly tasks: readonly Task[];
  readonly bars: ChartBar[];
  readonly holds: Map<string, number>;
  at: number;
  clockS: number;
  queuedS: number;
  waitsFor: string | null;
}

/**
 * The robots' cycles against one another. All start together, each does its cycle once, and the cell's cycle ends with the last of them. One
 * robot at a time is in a zone: whoever comes first goes in, of equals the one that stands first in the list; the others wait.
 * @param zoneNames by id, for what is said.
 */
export function cellCycle(
  estimates: readonly CycleEstimate[],
  sequences: ReadonlyMap<string, Robot['sequence']>,
  zoneNames: ReadonlyMap<string, string>,
): CellCycle {
  const nameOf = (zoneId: string): string => zoneNames.get(zoneId) ?? 'A zone';
  const stays: ZoneStay[] = [];
  const problems: string[] = [];
  const heldBy = new Map<string, Runner>();
  const runners = estimates.map((estimate): Runner => ({
    estimate,
    tasks: tasksOf(estimate, sequences.get(estimate.robotId) ?? []),
    bars: [],
    holds: new Map(),
    at: 0,
    clockS: 0,
    queuedS: 0,
    waitsFor: null,
  }));

  const enter = (runner: Runner, zoneId: string): void => {
    heldBy.set(zoneId, runner);
    runner.holds.set(zoneId, runner.clockS);
  };
  const leave = (runner: Runner, zoneId: string): void => {
    stays.push({
      zoneId,
      robotId: runner.estimate.robotId,
      fromS: runner.holds.get(zoneId)!,
      toS: runner.clockS,
    });
    runner.holds.delete(zoneId);
    heldBy.delete(zoneId);
    const [next] = runners.filter(({ waitsFor }) => waitsFor === zoneId).sort((a, b) => a.clockS - b.clockS);
    if (!next) return;
    const { stepId } = next.tasks[next.at];
    next.waitsFor = null;
    if (runner.clockS > next.clockS) {
      const label = `Waits for ${nameOf(zoneId)}`;
      next.bars.push({ stepId, kind: 'queue', label, fromS: next.clockS, toS: runner.clockS });
      next.queuedS += runner.clockS - next.clockS;
      next.clockS = runner.clockS;
    }
    enter(next, zoneId);
    next.at += 1;
  };
  const finish = (runner: Runner): void => {
    for (const zoneId of [...runner.holds.keys()]) {
      problems.push(
        `${runner.estimate.robotName} never leaves ${nameOf(zoneId)}. It is taken to leave at the end of its cycle.`,
      );
      leave(runner, zoneId);
    }
  };
  const take = (runner: Runner): void => {
    const task = runner.tasks[runner.at];
    const { zoneId, stepId, kind, label, seconds } = task;
    if (kind === 'enter' && zoneId) {
      const holder = heldBy.get(zoneId);
      if (holder && holder !== runner) {
        runner.waitsFor = zoneId;
        return;
      }
      if (!holder) enter(runner, zoneId);
    } else if (kind === 'leave' && zoneId) {
      if (runner.holds.has(zoneId)) leave(runner, zoneId);
      else problems.push(`${runner.estimate.robotName} leaves ${nameOf(zoneId)} without having entered it.`);
    } else if (kind === 'end') {
      finish(runner);
    } else if (kind !== 'enter' && kind !== 'leave' && seconds > 0) {
      runner.bars.push({ stepId, kind, label, fromS: runner.clockS, toS: runner.clockS + seconds });
      runner.clockS += seconds;
    }
    runner.at += 1;
  };

  // The one that is earliest goes on: what it does cannot depend on what happens later.
  const isReady = ({ at, tasks, waitsFor }: Runner): boolean => at < tasks.length && waitsFor === null;
  for (;;) {
    const ready = runners.filter(isReady);
    if (ready.length === 0) break;
    take(ready.reduce((first, next) => (next.clockS < first.clockS ? next : first)));
  }
  const stuck = runners.filter(({ waitsFor }) => waitsFor !== null);
  if (stuck.length > 0)
    problems.push(
      `${stuck.map(({ estimate, waitsFor }) => `${estimate.robotName} waits for ${nameOf(waitsFor!)}`).join(' and ')}, for ever. ` +
        'Let every robot enter the zones in the same order, or leave one before it enters the next.',
    );
  return {
    robots: runners.map(timesOf),
    stays,
    endS: runners.reduce((end, { clockS }) => Math.max(end, clockS), 0),
    problems,
  };
}

function tasksOf(estimate: CycleEstimate, sequence: Robot['sequence']): Task[] {
  const steps = new Map(sequence.map((step) => [step.id, step]));
  const tasks = estimate.steps.flatMap(({ stepId, label, moveS, motion, runS, holdS }): Task[] => {
    const step = steps.get(stepId);
    if (step?.kind === 'zone') return [{ stepId, kind: step.action, label, seconds: 0, zoneId: step.zoneId }];
    return [
      { stepId, kind: motion ?? 'joint', label: `To ${label}`, seconds: moveS, zoneId: null },
      { stepId, kind: 'path', label, seconds: runS, zoneId: null },
      { stepId, kind: 'hold', label, seconds: holdS, zoneId: null },
    ];
  });
  // The end is a moment like any other: what it lets go of is let go of then.
  return [...tasks, { stepId: '', kind: 'end', label: '', seconds: 0, zoneId: null }];
}

function timesOf({ estimate, bars, queuedS, clockS }: Runner): RobotTimes {
  return {
    robotId: estimate.robotId,
    robotName: estimate.robotName,
    bars,
    queuedS,
    endS: clockS,
    targetS: estimate.targetS,
    marginS: estimate.targetS === null ? null : estimate.targetS - clockS,
  };
}
