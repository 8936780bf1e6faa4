import { describe, expect, it } from 'vitest';
import { boundsOfPoints } from '@/lib/layout/viewport';
import { aligned, distributed, type Alignment } from './arrange';
import { applyChanges, type Items } from './changes';
import { footprint } from './footprint';
import { grouped } from './groups';
import { newBlock } from './make-items';
import { seeded } from './testing/seeded';

const random = seeded(11);
const block = (xMm: number, yMm: number, width: number, depth: number) =>
  newBlock(new Map(), 'fixture', { id: random.id(), xMm, yMm }, { width, depth });
const sheetOf = (...blocks: ReturnType<typeof block>[]): Items => new Map(blocks.map((item) => [item.id, item]));
const boxes = (items: Items) => [...items.values()].map((item) => boundsOfPoints(footprint(item))!);

const three = () => sheetOf(block(0, 0, 400, 200), block(900, 500, 200, 600), block(2000, -300, 1000, 100));

describe('lining up', () => {
  // By hand from the sizes above: outer edges −200…2500 and −350…800, middles 1150 and 225.
  const expected: Record<Alignment, [keyof ReturnType<typeof boxes>[number] | 'midX' | 'midY', number]> = {
    left: ['minXMm', -200],
    right: ['maxXMm', 2500],
    near: ['minYMm', -350],
    far: ['maxYMm', 800],
    centre: ['midX', 1150],
    middle: ['midY', 225],
  };
  it.each(Object.keys(expected) as Alignment[])('%s', (alignment) => {
    const items = three();
    const after = applyChanges(items, aligned(items, [...items.keys()], alignment));
    const [edge, value] = expected[alignment];
    for (const box of boxes(after)) {
      const read =
        edge === 'midX' ? (box.minXMm + box.maxXMm) / 2 : edge === 'midY' ? (box.minYMm + box.maxYMm) / 2 : box[edge];
      expect(read).toBeCloseTo(value, 2);
    }
  });

  it('leaves a locked one where it is and brings the others to it', () => {
    const items = three();
    const [first, second, third] = [...items.values()];
    const held = new Map(items).set(second.id, { ...second, locked: true });
    const after = applyChanges(held, aligned(held, [first.id, second.id, third.id], 'left'));
    expect(after.get(second.id)).toBe(held.get(second.id));
    expect(boxes(after).map(({ minXMm }) => minXMm)).toEqual([800, 800, 800]);
  });

  it('moves a group as one', () => {
    const items = three();
    const [first, second, third] = [...items.values()];
    const withGroup = applyChanges(items, grouped(items, [first.id, second.id], random.id()));
    const after = applyChanges(withGroup, aligned(withGroup, [...items.keys()], 'right'));
    const by = after.get(first.id)!.xMm - first.xMm;
    expect(by).toBe(1500);
    expect(after.get(second.id)!.xMm - second.xMm).toBe(by);
    expect(after.get(third.id)).toBe(third);
  });

  it('needs two', () => {
    const items = three();
    expect(aligned(items, [[...items.keys()][0]], 'left')).toEqual([]);
  });
});

describe('spacing evenly', () => {
  it('makes equal gaps and leaves the outermost where they are', () => {
    const items = three();
    const after = applyChanges(items, distributed(items, [...items.keys()], 'across'));
    const [one, two, three_] = boxes(after);
    expect(two.minXMm - one.maxXMm).toBeCloseTo(three_.minXMm - two.maxXMm, 1);
    expect([one.minXMm, three_.maxXMm]).toEqual([-200, 2500]);
  });

  it('needs three', () => {
    const items = three();
    expect(distributed(items, [...items.keys()].slice(0, 2), 'away')).toEqual([]);
  });
});
