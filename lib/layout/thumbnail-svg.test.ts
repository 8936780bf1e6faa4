import { describe, expect, it } from 'vitest';
import { rectangleOutline } from './geometry';
import { itemSchema, type Item } from './items';
import { DAY_PALETTE } from './palette';
import { thumbnailSvg } from './thumbnail-svg';

const SIZE = { widthPx: 160, heightPx: 100 };
const fixture = (xMm: number, more: object = {}): Item =>
  itemSchema.parse({
    kind: 'fixture',
    id: '00000000-0000-4000-8000-000000000001',
    name: '<Tray & co>',
    xMm,
    yMm: 0,
    angleDeg: 0,
    outlineMm: rectangleOutline(1000, 500),
    zToMm: 800,
    ...more,
  });
const corners = (svg: string) =>
  [...svg.matchAll(/[ML]([\d.-]+) ([\d.-]+)/g)].map(([, x, y]) => [Number(x), Number(y)]);

describe('the small picture of a layout', () => {
  it('shows everything within its margins, in proportion, with y up', () => {
    const points = corners(thumbnailSvg([fixture(0), fixture(9000)], DAY_PALETTE, SIZE));
    expect(points).toHaveLength(8);
    const xs = points.map(([x]) => x);
    // 10 000 mm over 160 − 2·6 px.
    expect(Math.min(...xs)).toBeCloseTo(6, 1);
    expect(Math.max(...xs)).toBeCloseTo(154, 1);
    const [[x1, y1], [x2], [, y3]] = points;
    expect((x2 - x1) / (y1 - y3)).toBeCloseTo(2, 1);
    expect(y1).toBeGreaterThan(y3);
  });

  it('leaves out what is hidden and never letters a name', () => {
    const svg = thumbnailSvg([fixture(0), fixture(9000, { hidden: true })], DAY_PALETTE, SIZE);
    expect(corners(svg)).toHaveLength(4);
    expect(svg).not.toContain('Tray');
  });

  it('is a bare sheet for an empty layout', () => {
    expect(thumbnailSvg([], DAY_PALETTE, SIZE)).toMatch(/^<svg [^>]*><rect [^>]*\/><\/svg>$/);
  });
});
