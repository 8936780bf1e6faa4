import { describe, expect, it } from 'vitest';
import { fixtureSchema, robotSchema, sequenceStepSchema, type SequenceStep } from '@/lib/layout/items';
import { newTaskPath, newTaskPattern, withBow, withCornerAfter, withoutCorner } from './task-edits';
import { stepChoices, withoutStep, withStep, withStepEdited, withStepMoved } from './sequence-edits';

const id = (digit: number): string => `00000000-0000-4000-8000-${String(digit).padStart(12, '0')}`;
const wait = (digit: number): SequenceStep => sequenceStepSchema.parse({ kind: 'wait', id: id(digit), seconds: digit });
const steps = [1, 2, 3, 4].map(wait);
const ids = (list: readonly SequenceStep[]): string[] => list.map((step) => step.id);

const fixture = fixtureSchema.parse({
  kind: 'fixture',
  id: id(50),
  name: 'Tray',
  xMm: 0,
  yMm: 0,
  angleDeg: 0,
  outlineMm: [
    [0, 0],
    [1, 0],
    [0, 1],
  ],
  zToMm: 800,
  taskPoints: [
    { id: id(60), name: 'Later', xMm: 0, yMm: 0, zMm: 850, order: 7 },
    { id: id(61), name: 'First', xMm: 0, yMm: 0, zMm: 850, order: 1 },
  ],
});

describe('a sequence', () => {
  it('takes a step after the one that is chosen, or at its end', () => {
    expect(ids(withStep(steps, wait(9), id(2)))).toEqual([1, 2, 9, 3, 4].map(id));
    expect(ids(withStep(steps, wait(9), null))).toEqual([1, 2, 3, 4, 9].map(id));
  });

  it('moves a step, and no farther than its ends', () => {
    expect(ids(withStepMoved(steps, id(1), 2))).toEqual([2, 3, 1, 4].map(id));
    expect(ids(withStepMoved(steps, id(4), 0))).toEqual([4, 1, 2, 3].map(id));
    expect(ids(withStepMoved(steps, id(4), 99))).toEqual([1, 2, 3, 4].map(id));
    expect(ids(withStepMoved(steps, id(1), -1))).toEqual([1, 2, 3, 4].map(id));
    expect(ids(withStepMoved(steps, id(77), 0))).toEqual([1, 2, 3, 4].map(id));
  });

  it('gives a step up, and changes one in its place', () => {
    expect(ids(withoutStep(steps, id(3)))).toEqual([1, 2, 4].map(id));
    const changed = { ...steps[1], seconds: 20 } as SequenceStep;
    expect(withStepEdited(steps, changed)[1]).toBe(changed);
  });

  it('offers what the sheet has, in the order of the work, and nothing that is not valid', () => {
    const path = newTaskPath(fixture, id(70));
    const pattern = newTaskPattern({ ...fixture, taskPaths: [path] }, id(71));
    const choices = stepChoices([{ ...fixture, taskPaths: [path], taskPatterns: [pattern] }]);
    expect(choices.map(({ label }) => label)).toEqual([
      'First',
      'Later',
      path.name,
      `${pattern.name}, place 1`,
      'Grip',
      'Handshake',
      'Process',
    ]);
    const robot = { kind: 'robot', id: id(1), name: 'R1', armId: id(2), xMm: 0, yMm: 0, angleDeg: 0 };
    const sequence = choices.map(({ make }, index) => make(id(200 + index)));
    expect(robotSchema.parse({ ...robot, sequence }).sequence).toEqual(sequence);
  });
});

describe('the corners of a path', () => {
  const { points } = newTaskPath(fixture, id(70));

  it('get one more halfway to the next, or onward from the last', () => {
    expect(withCornerAfter(points, 0).map(({ xMm }) => xMm)).toEqual([-100, 0, 100]);
    expect(withCornerAfter(points, 1).map(({ xMm }) => xMm)).toEqual([-100, 100, 300]);
  });

  it('lose the arc that led to or from a corner that is gone', () => {
    const bent = withBow(withCornerAfter(points, 0), 2, true);
    expect(bent[2].arcVia).toEqual({ xMm: 50, yMm: 25, zMm: 830 });
    expect(withoutCorner(bent, 1).map(({ arcVia }) => arcVia)).toEqual([null, null]);
    expect(withBow(bent, 2, false)[2].arcVia).toBeNull();
  });
});
