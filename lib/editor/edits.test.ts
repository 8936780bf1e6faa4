import { describe, expect, it } from 'vitest';
import type { Fixture } from '@/lib/layout/items';
import { applyChanges, type Items } from './changes';
import { duplicated, edited, editedTaskPoint, reorderedTaskPoint } from './edits';
import { newBlock, newTaskPoint } from './make-items';
import { inOrder, reorder } from './order';
import { normalAngle, snapAngle, snapSpot } from './snapping';
import { seeded } from './testing/seeded';

const random = seeded(12);
const fixture = newBlock(new Map(), 'fixture', { id: random.id(), xMm: 0, yMm: 0 }) as Fixture;

describe('typed values', () => {
  it('set a field', () => {
    expect(edited(fixture, { xMm: 1250.5 })).toMatchObject({ ok: true, value: { xMm: 1250.5, name: 'Fixture A' } });
  });

  it.each([
    [{ xMm: 2e6 }, /farther than a sheet goes/],
    [{ xMm: NaN }, /no number/],
    [{ name: '  ' }, /Give it a name/],
    [{ zToMm: 0 }, /top must be above the bottom/],
    [
      {
        outlineMm: [
          [0, 0],
          [100, 100],
          [100, 0],
          [0, 100],
        ] as [number, number][],
      },
      /cross/,
    ],
    [
      {
        outlineMm: [
          [0, 0],
          [100, 0],
        ] as [number, number][],
      },
      /at least three corners/,
    ],
  ])('are refused with the reason: %j', (patch, reason) => {
    const edit = edited(fixture, patch);
    expect(edit.ok ? '' : edit.message).toMatch(reason);
  });

  it('refuse a wanted speed of nothing at its task point', () => {
    const point = newTaskPoint(fixture, random.id(), [0, 0]);
    const held = { ...fixture, taskPoints: [point] };
    const edit = editedTaskPoint(held, point.id, { speedMmS: 0 });
    expect(edit.ok ? '' : edit.message).toMatch(/above zero/);
  });
});

describe('the order of things', () => {
  it('moves an item between its neighbours by changing it alone once the places differ', () => {
    let items: Items = new Map(
      [1, 2, 3].map((order) => {
        const item = {
          ...newBlock(new Map(), 'obstacle', { id: random.id(), xMm: 0, yMm: 0 }),
          order,
          name: `${order}`,
        };
        return [item.id, item];
      }),
    );
    const last = inOrder(items)[2].id;
    const changes = reorder(items, last, -1);
    expect(changes).toHaveLength(1);
    items = applyChanges(items, changes);
    expect(inOrder(items).map(({ name }) => name)).toEqual(['1', '3', '2']);
    for (let count = 0; count < 200; count += 1) items = applyChanges(items, reorder(items, inOrder(items)[1].id, 1));
    expect(inOrder(items).map(({ name }) => name)).toEqual(['1', '3', '2']);
  });

  it('numbers task points afresh', () => {
    const points = ['a', 'b', 'c'].map((name, order) => ({
      ...newTaskPoint(fixture, random.id(), [0, 0]),
      name,
      order,
    }));
    const moved = reorderedTaskPoint({ ...fixture, taskPoints: points }, points[2].id, -1);
    expect(moved.taskPoints.map(({ name, order }) => [order, name])).toEqual([
      [0, 'a'],
      [1, 'c'],
      [2, 'b'],
    ]);
  });

  it('gives a duplicate its own ids and name', () => {
    const point = newTaskPoint(fixture, random.id(), [10, 20]);
    const items = new Map([[fixture.id, { ...fixture, taskPoints: [point] }]]);
    const { changes, copies } = duplicated(items, [fixture.id], 200, random.id);
    const copy = changes[0].after as Fixture;
    expect(copies).toEqual([copy.id]);
    expect(copy).toMatchObject({ name: 'Fixture B', xMm: 200, yMm: -200 });
    expect(copy.taskPoints[0].id).not.toBe(point.id);
  });
});

describe('snapping', () => {
  const grid = { gridMm: 50, angleDeg: 5 };
  it('rounds to the grid and to the angle steps unless suspended', () => {
    expect(snapSpot({ xMm: 1024, yMm: -26 }, grid, false)).toEqual({ xMm: 1000, yMm: -50 });
    expect(snapSpot({ xMm: 1024.126, yMm: 0 }, grid, true)).toEqual({ xMm: 1024.13, yMm: 0 });
    expect(snapAngle(182.4, grid, false)).toBe(180);
    expect(snapAngle(-182.6, grid, false)).toBe(175);
  });
  it('writes turns between −180 and 180 degrees', () => {
    expect([270, -180, 540, 0, -0.001].map(normalAngle)).toEqual([-90, 180, 180, 0, 0]);
  });
});
