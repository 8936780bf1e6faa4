import { describe, expect, it } from 'vitest';
import { rectangleOutline } from '../geometry';
import { obstacleSchema, walkwaySchema, type Item } from '../items';
import type { Space } from '../spaces/spaces';
import { distanceValuesSchema, isChanged } from './distance-values';
import { gapRows } from './gap-rows';
import { walkwayRows } from './walkway-check';

const id = (n: number) => `00000000-0000-4000-8000-00000000000${n}`;
const obstacle = (n: number, xMm: number, yMm: number): Item =>
  obstacleSchema.parse({ kind: 'obstacle', id: id(n), name: `Box ${n}`, xMm, yMm, angleDeg: 0, outlineMm: rectangleOutline(200, 200), zToMm: 1000 }); // prettier-ignore
const walkway = (widthMm: number): Item =>
  walkwaySchema.parse({ kind: 'walkway', id: id(9), name: 'Aisle', xMm: 0, yMm: 0, angleDeg: 0, pointsMm: [[0, 0], [4000, 0]], widthMm }); // prettier-ignore

const values = distanceValuesSchema.parse({});

it('the figures are those of ISO 13854 and ISO 14122-2 as secondary sources and memory give them', () => {
  expect(values).toMatchObject({ bodyMm: 500, headMm: 300, legMm: 180, footMm: 120, toesMm: 50, armMm: 120 });
  expect(values).toMatchObject({
    fistMm: 100,
    fingerMm: 25,
    walkwayLeastMm: 600,
    walkwayBetterMm: 800,
    reducedSpeedMmS: 250,
  });
  expect(isChanged('bodyMm', { ...values, bodyMm: 510 })).toBe(true);
  expect(isChanged('bodyMm', values)).toBe(false);
});

describe('a walkway', () => {
  it.each([
    [599, 'below'],
    [600, 'least'],
    [800, 'better'],
  ] as const)('%i mm wide is %s', (widthMm, rank) => {
    expect(walkwayRows([walkway(widthMm)], values, 100)).toMatchObject([{ rank, inTheWay: [] }]);
  });

  it('names what stands in it, and not what stands beside it', () => {
    // 800 mm wide: its edge lies at y = 400; a box of 200 mm at y = 500 touches it from outside.
    const rows = walkwayRows([walkway(800), obstacle(1, 1000, 500), obstacle(2, 2000, 450)], values, 100);
    expect(rows[0].inTheWay).toEqual([{ id: id(2), name: 'Box 2' }]);
  });
});

describe('gaps between a space and fixed things', () => {
  const space: Space = { kind: 'maximum', how: '', outlineMm: [[-1000, -1000], [1000, -1000], [1000, 1000], [-1000, 1000]] }; // prettier-ignore

  it('are told where a body has no room, with what has', () => {
    const items = [obstacle(1, 1220, 0), obstacle(2, 1500, 0), obstacle(3, 1700, 0), obstacle(4, 900, 0)];
    // Faces at 1120, 1400 and 1600 mm: gaps of 120, 400 and 600 mm; the last box stands within the space.
    expect(gapRows(items, space, values)).toEqual([
      { itemId: id(4), name: 'Box 4', gapMm: 0, keeps: null },
      { itemId: id(1), name: 'Box 1', gapMm: 120, keeps: 'armMm' },
      { itemId: id(2), name: 'Box 2', gapMm: 400, keeps: 'headMm' },
    ]);
  });

  it('follow a changed figure', () => {
    expect(gapRows([obstacle(3, 1700, 0)], space, { ...values, bodyMm: 700 })).toMatchObject([{ gapMm: 600 }]);
  });
});
