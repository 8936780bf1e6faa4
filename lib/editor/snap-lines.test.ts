import { describe, expect, it } from 'vitest';
import type { Fixture } from '@/lib/layout/items';
import { newBlock, newTaskPoint } from './make-items';
import { boxOf, snapNear } from './snap-lines';
import { DEFAULT_SNAPPING, NO_SNAPPING, onRoundAngle } from './snapping';
import { seeded } from './testing/seeded';

const random = seeded(31);
const block = (xMm: number, yMm: number, width: number, depth: number) =>
  newBlock(new Map(), 'fixture', { id: random.id(), xMm, yMm }, { width, depth }) as Fixture;
const resting = block(1013, 2007, 600, 400);
const items = new Map([[resting.id, resting]]);
const at = (xMm: number, yMm: number, more: Partial<Parameters<typeof snapNear>[0]> = {}) =>
  snapNear({ wanted: { xMm, yMm }, items, planPoints: [], snapping: DEFAULT_SNAPPING, reachMm: 30, ...more });

describe('snapping to what is near', () => {
  it('falls to an edge on one axis and to the grid on the other', () => {
    // The left edge stands at 1013 − 300.
    expect(at(720, 5009)).toMatchObject({ xMm: 713, yMm: 5000 });
  });

  it('falls to the middle, and shows a guide from the one to the other', () => {
    const { xMm, guides } = at(1000, 5000);
    expect(xMm).toBe(1013);
    expect(guides).toEqual([{ axis: 'x', atMm: 1013, fromMm: 1807, toMm: 5000, what: 'centre' }]);
  });

  it('lets a box snap with its own edges', () => {
    const moving = block(0, 0, 1000, 200);
    const box = boxOf([moving])!;
    const moved = { at: moving, box, itemIds: new Set([moving.id]) };
    // Its left edge at 1313, the right edge of the one at rest, puts its place at 1813.
    expect(at(1800, 5000, { moved })).toMatchObject({ xMm: 1813, yMm: 5000 });
  });

  it('never snaps a thing to itself', () => {
    const moved = { at: resting, box: boxOf([resting])!, itemIds: new Set([resting.id]) };
    expect(at(1020, 2020, { moved })).toMatchObject({ xMm: 1000, yMm: 2000, guides: [] });
  });

  it('falls to task points, wherever the fixture is turned', () => {
    const turned: Fixture = { ...resting, angleDeg: 90 };
    turned.taskPoints = [newTaskPoint(turned, random.id(), [77, 0])];
    const found = at(1005, 2090, { items: new Map([[turned.id, turned]]) });
    expect(found).toMatchObject({ yMm: 2084 });
    expect(found.guides.some(({ what }) => what === 'taskPoint')).toBe(true);
  });

  it('falls to wall points only near them', () => {
    const planPoints = [[4011, 3017] as const];
    expect(at(4000, 3000, { planPoints })).toMatchObject({ xMm: 4011, yMm: 3017 });
    expect(at(4000, 3400, { planPoints })).toMatchObject({ xMm: 4000, yMm: 3400 });
  });

  it('goes nowhere while it is suspended, and leaves hidden items alone', () => {
    expect(at(720.123, 5009, { snapping: NO_SNAPPING })).toEqual({ xMm: 720.12, yMm: 5009, guides: [] });
    const hidden = new Map([[resting.id, { ...resting, hidden: true }]]);
    expect(at(720, 5009, { items: hidden })).toMatchObject({ xMm: 700 });
  });
});

describe('round angles of a side', () => {
  it('takes a side that nearly runs at 30° to 30° on a length of the grid', () => {
    const end = onRoundAngle([0, 0], { xMm: 1732, yMm: 1010 }, DEFAULT_SNAPPING);
    // Length √(1732² + 1010²) ≈ 2005, on the grid of 50: 2000; cosine and sine of 30° are √3/2 and 1/2.
    expect(end).toEqual([1732.05, 1000]);
  });

  it('leaves other sides, and all where turns do not snap', () => {
    expect(onRoundAngle([0, 0], { xMm: 1000, yMm: 400 }, DEFAULT_SNAPPING)).toBe(null);
    expect(onRoundAngle([0, 0], { xMm: 1732, yMm: 1000 }, NO_SNAPPING)).toBe(null);
  });
});
