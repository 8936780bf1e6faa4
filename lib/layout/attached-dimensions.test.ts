import { describe, expect, it } from 'vitest';
import { detached, settledDimension, settledItems } from './attached-dimensions';
import { itemToFloor } from './geometry';
import { dimensionSchema, obstacleSchema, type Dimension } from './items';

const id = (last: number) => `00000000-0000-4000-8000-00000000000${last}`;
const placed = { name: 'X', angleDeg: 0 };
const square = [
  [0, 0],
  [100, 0],
  [100, 100],
  [0, 100],
];
const post = (last: number, xMm: number, yMm: number, angleDeg = 0) =>
  obstacleSchema.parse({
    ...placed,
    kind: 'obstacle',
    id: id(last),
    xMm,
    yMm,
    angleDeg,
    outlineMm: square,
    zToMm: 500,
  });
const between = (from: number | null, to: number | null): Dimension =>
  dimensionSchema.parse({
    ...placed,
    kind: 'dimension',
    id: id(9),
    xMm: 50,
    yMm: 60,
    angleDeg: 30,
    fromMm: [0, 0],
    toMm: [1000, 0],
    ...(from && { fromItemId: id(from), fromAnchorMm: [100, 0] }),
    ...(to && { toItemId: id(to), toAnchorMm: [0, 100] }),
  });
const ends = (dimension: Dimension) => [dimension.fromMm, dimension.toMm].map((point) => itemToFloor(dimension, point));

describe('a dimension that is attached', () => {
  it('measures from point to point of its items, however they and it are turned', () => {
    // By hand: a quarter turn takes (100, 0) to (0, 100) and (0, 100) to (−100, 0).
    const items = [post(1, 1000, 2000, 90), post(2, 5000, 2000, 90)];
    const settled = settledDimension(between(1, 2), (wanted) => items.find((item) => item.id === wanted));
    const [from, to] = ends(settled);
    expect(from[0]).toBeCloseTo(1000, 1);
    expect(from[1]).toBeCloseTo(2100, 1);
    expect(to[0]).toBeCloseTo(4900, 1);
    expect(to[1]).toBeCloseTo(2000, 1);
  });

  it('leaves a free end where it is, and everything where it last stood once the item is gone', () => {
    const free = settledDimension(between(1, null), () => post(1, 3000, 3000));
    expect(free.toMm).toEqual([1000, 0]);
    const orphan = between(1, 2);
    expect(settledDimension(orphan, () => undefined)).toBe(orphan);
  });

  it('keeps the identity of what did not change, and draws anew what did', () => {
    const items = [post(1, 0, 0), between(1, null), post(2, 900, 900)];
    const first = settledItems(items);
    expect(settledItems(items)[1]).toBe(first[1]);
    const moved = [post(1, 700, 0), items[1], items[2]];
    expect(settledItems(moved)[1]).not.toBe(first[1]);
    expect(settledItems(moved)[2]).toBe(items[2]);
    const plain = [post(1, 0, 0)];
    expect(settledItems(plain)).toBe(plain);
  });

  it('stays where it stands when one of its items goes, and still follows the other', () => {
    const items = [post(1, 1000, 0), post(2, 5000, 0)];
    const itemOf = (wanted: string) => items.find((item) => item.id === wanted);
    const before = settledDimension(between(1, 2), itemOf);
    const left = detached(between(1, 2), (gone) => gone === id(1), itemOf);
    expect(left).toMatchObject({ fromMm: before.fromMm, toItemId: id(2), toAnchorMm: [0, 100] });
    expect(left?.fromItemId).toBeUndefined();
    expect(left && ends(settledDimension(left, itemOf))).toEqual(ends(before));
    expect(detached(between(2, null), (gone) => gone === id(1), itemOf)).toBeNull();
  });
});
