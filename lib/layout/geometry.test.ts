import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  floorToItem,
  itemToFloor,
  outlineFault,
  polygonAreaMm2,
  rectangleOutline,
  segmentsMeet,
  signedAreaMm2,
} from './geometry';
import { itemSchema } from './items';

const millimetres = fc.double({ min: -1e6, max: 1e6, noNaN: true });
const placements = fc.record({
  xMm: millimetres,
  yMm: millimetres,
  angleDeg: fc.double({ min: -360, max: 360, noNaN: true }),
});

describe('frames', () => {
  it('turns counter-clockwise', () => {
    const [x, y] = itemToFloor({ xMm: 100, yMm: 50, angleDeg: 90 }, [10, 0]);
    expect(x).toBeCloseTo(100, 9);
    expect(y).toBeCloseTo(60, 9);
  });

  it('comes back to the same point', () => {
    fc.assert(
      fc.property(placements, millimetres, millimetres, (placement, xMm, yMm) => {
        const [backX, backY] = floorToItem(placement, itemToFloor(placement, [xMm, yMm]));
        expect(Math.hypot(backX - xMm, backY - yMm)).toBeLessThan(1e-6);
      }),
    );
  });
});

describe('area', () => {
  it('of a rectangle is width times depth, whichever way round', () => {
    const outline = rectangleOutline(1200, 400);
    expect(signedAreaMm2(outline)).toBe(480_000);
    expect(signedAreaMm2([...outline].reverse())).toBe(-480_000);
    expect(polygonAreaMm2([...outline].reverse())).toBe(480_000);
  });

  it('does not change when the outline is carried elsewhere', () => {
    fc.assert(
      fc.property(placements, (placement) => {
        const carried = rectangleOutline(900, 700).map((point) => itemToFloor(placement, point));
        expect(polygonAreaMm2(carried)).toBeCloseTo(630_000, 1);
      }),
    );
  });
});

describe('segments', () => {
  it('meet when they cross, touch or overlap', () => {
    expect(segmentsMeet([0, 0], [10, 10], [0, 10], [10, 0])).toBe(true);
    expect(segmentsMeet([0, 0], [10, 0], [5, 0], [5, 9])).toBe(true);
    expect(segmentsMeet([0, 0], [10, 0], [5, 0], [15, 0])).toBe(true);
  });

  it('do not meet when apart, on one line or on two', () => {
    expect(segmentsMeet([0, 0], [10, 0], [0, 1], [10, 1])).toBe(false);
    expect(segmentsMeet([0, 0], [10, 0], [11, 0], [15, 0])).toBe(false);
    expect(segmentsMeet([0, 0], [10, 0], [12, -5], [12, 5])).toBe(false);
  });
});

describe('outline', () => {
  it('is sound for a rectangle and for a step', () => {
    expect(outlineFault(rectangleOutline(10, 20))).toBeNull();
    expect(outlineFault([...rectangleOutline(10, 20)].reverse())).toBeNull();
    expect(
      outlineFault([
        [0, 0],
        [20, 0],
        [20, 10],
        [10, 10],
        [10, 20],
        [0, 20],
      ]),
    ).toBeNull();
  });

  it('names the sides that cross', () => {
    expect(
      outlineFault([
        [0, 0],
        [10, 10],
        [10, 0],
        [0, 10],
      ]),
    ).toMatch(/^Sides 1 and 3 of the outline cross\./);
  });

  it('is refused where it doubles back, repeats a corner or is flat', () => {
    expect(
      outlineFault([
        [0, 0],
        [10, 0],
        [5, 0],
        [5, 5],
      ]),
    ).toMatch(/Sides 1 and 2/);
    expect(
      outlineFault([
        [0, 0],
        [0, 0],
        [5, 5],
      ]),
    ).toMatch(/Corners 1 and 2 lie on one spot/);
    expect(
      outlineFault([
        [0, 0],
        [5, 0],
        [10, 0],
      ]),
    ).not.toBeNull();
  });

  it('is checked where an item comes in', () => {
    const obstacle = {
      kind: 'obstacle',
      id: '3f0c2c8e-6a55-4d0b-8a55-64a8c0a0d001',
      name: 'Column',
      xMm: 0,
      yMm: 0,
      angleDeg: 0,
      zToMm: 3000,
      outlineMm: [
        [0, 0],
        [10, 10],
        [10, 0],
        [0, 10],
      ],
    };
    const refused = itemSchema.safeParse(obstacle);
    expect(refused.success).toBe(false);
    expect(refused.error?.issues[0].path).toEqual(['outlineMm']);
    expect(refused.error?.issues[0].message).toMatch(/cross/);
    expect(itemSchema.safeParse({ ...obstacle, outlineMm: rectangleOutline(400, 400) }).success).toBe(true);
  });
});
