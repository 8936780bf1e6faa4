import { describe, expect, it } from 'vitest';
import type { SequenceStep } from '../items';
import { cellCycle } from './cell-cycle';
import type { CycleEstimate } from './estimate';

const id = (digit: number): string => `00000000-0000-4000-8000-${String(digit).padStart(12, '0')}`;
const ZONE = id(1);
const OTHER = id(2);
const NAMES = new Map([
  [ZONE, 'Handover'],
  [OTHER, 'Press'],
]);

type Part = number | readonly ['enter' | 'leave', string];

/** A robot that moves for so many seconds, or enters or leaves a zone. */
function robot(digit: number, parts: readonly Part[]): { estimate: CycleEstimate; sequence: SequenceStep[] } {
  const sequence = parts.map((part, index): SequenceStep => {
    const stepId = id(100 * digit + index);
    return typeof part === 'number'
      ? { kind: 'wait', id: stepId, cause: 'process', name: `Work ${index}`, seconds: part }
      : { kind: 'zone', id: stepId, zoneId: part[1], action: part[0] };
  });
  const steps = parts.map((part, index) => ({
    stepId: id(100 * digit + index),
    kind: typeof part === 'number' ? ('wait' as const) : ('zone' as const),
    label: `Step ${index}`,
    moveS: 0,
    motion: null,
    runS: 0,
    holdS: typeof part === 'number' ? part : 0,
    slowestJoint: null,
    lengthMm: null,
    leastSpeedMmS: null,
    crossings: [],
    branch: '',
    posture: null,
  }));
  const totalS = parts.reduce<number>((sum, part) => sum + (typeof part === 'number' ? part : 0), 0);
  const estimate = {
    robotId: id(digit),
    robotName: `R${digit}`,
    steps,
    problems: [],
    totalS,
    targetS: 5,
    marginS: 5 - totalS,
  };
  return { estimate, sequence };
}

const run = (...robots: ReturnType<typeof robot>[]) =>
  cellCycle(
    robots.map(({ estimate }) => estimate),
    new Map(robots.map(({ estimate, sequence }) => [estimate.robotId, sequence])),
    NAMES,
  );

describe('robots against one another', () => {
  it('do not mind one another without a shared zone', () => {
    const { robots, endS, problems } = run(robot(1, [1, 2]), robot(2, [0.5]));
    expect(robots.map((each) => each.endS)).toEqual([3, 0.5]);
    expect(endS).toBe(3);
    expect(problems).toEqual([]);
  });

  it('wait for a zone that another one is in; the one that comes first goes first', () => {
    // By hand: R2 is in the zone from 0.5 to 2.5 s, so R1, there at 1 s, waits 1.5 s and is done at 2.5 + 1 + 1 = 4.5 s.
    const one = robot(1, [1, ['enter', ZONE], 1, ['leave', ZONE], 1]);
    const two = robot(2, [0.5, ['enter', ZONE], 2, ['leave', ZONE], 0.25]);
    const { robots, stays, endS, problems } = run(one, two);
    expect(problems).toEqual([]);
    expect(robots[0]).toMatchObject({ queuedS: 1.5, endS: 4.5, marginS: 0.5 });
    expect(robots[1]).toMatchObject({ queuedS: 0, endS: 2.75 });
    expect(endS).toBe(4.5);
    expect(stays.map(({ fromS, toS }) => [fromS, toS])).toEqual([
      [0.5, 2.5],
      [2.5, 3.5],
    ]);
    expect(robots[0].bars.find(({ kind }) => kind === 'queue')).toMatchObject({
      label: 'Waits for Handover',
      fromS: 1,
      toS: 2.5,
    });
  });

  it('queue in the order in which they come', () => {
    const stay = (digit: number, before: number) => robot(digit, [before, ['enter', ZONE], 1, ['leave', ZONE]]);
    const { robots } = run(stay(1, 0.3), stay(2, 0.2), stay(3, 0.1));
    expect(robots.map((each) => each.endS)).toEqual([3.1, 2.1, 1.1]);
  });

  it('that wait for one another for ever are named', () => {
    const one = robot(1, [['enter', ZONE], 1, ['enter', OTHER], 1, ['leave', OTHER], ['leave', ZONE]]);
    const two = robot(2, [['enter', OTHER], 1, ['enter', ZONE], 1, ['leave', ZONE], ['leave', OTHER]]);
    expect(run(one, two).problems[0]).toMatch(/^R1 waits for Press and R2 waits for Handover, for ever\./);
  });

  it('that never leave a zone, or leave one that they are not in, are told so and still timed', () => {
    const { robots, problems } = run(
      robot(1, [['enter', ZONE], 1]),
      robot(2, [0.5, ['enter', ZONE], 1, ['leave', OTHER], ['leave', ZONE]]),
    );
    expect(problems).toEqual([
      'R1 never leaves Handover. It is taken to leave at the end of its cycle.',
      'R2 leaves Press without having entered it.',
    ]);
    expect(robots.map((each) => each.endS)).toEqual([1, 2]);
  });
});
