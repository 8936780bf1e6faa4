import { describe, expect, it } from 'vitest';
import { belowOutline, isoLines, reachOutline, realmEdges, type ValueGrid } from './contours';

/** Cells of 50 mm whose first centre is at (−1000, −1000). */
function gridOf(valueAt: (xMm: number, yMm: number) => number): ValueGrid {
  const grid = { originMm: [-1000, -1000] as const, stepMm: 50, columns: 41, rows: 41 };
  const value = Float32Array.from({ length: 41 * 41 }, (_, cell) =>
    valueAt(-1000 + (cell % 41) * 50, -1000 + Math.floor(cell / 41) * 50),
  );
  return { grid, value };
}

const cone = (xMm: number, yMm: number) => 1000 - Math.hypot(xMm, yMm);
const areaOf = (rings: readonly (readonly (readonly [number, number])[])[]) =>
  Math.abs(
    rings.reduce(
      (sum, ring) =>
        sum +
        ring.reduce((twice, [x1, y1], index) => {
          const [x2, y2] = ring[(index + 1) % ring.length];
          return twice + x1 * y2 - x2 * y1;
        }, 0) /
          2,
      0,
    ),
  );

describe('lines of equal value', () => {
  it('lie where the value is: on a cone, circles about its middle', () => {
    const [line] = isoLines(gridOf(cone), [400]);
    expect(line.lines).toHaveLength(1);
    for (const [x, y] of line.lines[0]) expect(Math.hypot(x, y)).toBeCloseTo(600, -0.5);
    const [first, last] = [line.lines[0][0], line.lines[0].at(-1)];
    expect(first).toEqual(last);
  });

  it('stop where the reached floor stops, and do not run along its edge', () => {
    const half = gridOf((x, y) => (x < 0 ? NaN : cone(x, y)));
    const [line] = isoLines(half, [400]);
    expect(line.lines).toHaveLength(1);
    for (const [x, y] of line.lines[0]) {
      expect(x).toBeGreaterThanOrEqual(0);
      expect(Math.hypot(x, y)).toBeCloseTo(600, -0.5);
    }
  });

  it('bear labels on the line, upright', () => {
    const [line] = isoLines(gridOf(cone), [400]);
    expect(line.labels.length).toBeGreaterThan(0);
    for (const { xMm, yMm, angleRad } of line.labels) {
      expect(Math.hypot(xMm, yMm)).toBeCloseTo(600, -0.5);
      expect(Math.cos(angleRad)).toBeGreaterThanOrEqual(-1e-9);
    }
  });

  it('leave short lines without a label', () => {
    const [line] = isoLines(gridOf(cone), [930]);
    expect(line.lines.length).toBeGreaterThan(0);
    expect(line.labels).toEqual([]);
  });
});

describe('outlines', () => {
  it('go round the reached floor, holes taken out', () => {
    const ring = gridOf((x, y) => (Math.hypot(x, y) <= 800 && Math.hypot(x, y) >= 300 ? 1 : NaN));
    const cells = ring.value.filter((value) => !Number.isNaN(value)).length;
    const rings = reachOutline(ring);
    expect(rings).toHaveLength(2);
    // The outline cuts the corners of boundary cells, so it loses a little against the cells.
    expect(areaOf(rings) / (cells * 2500)).toBeGreaterThan(0.98);
    expect(areaOf(rings) / (cells * 2500)).toBeLessThanOrEqual(1.001);
  });

  it('of floor below the threshold end at the line of that value', () => {
    const map = gridOf(cone);
    const below = areaOf(belowOutline(map, 400));
    // The square of cells less the disc of radius 600 mm.
    expect(below).toBeCloseTo(2050 ** 2 - Math.PI * 600 ** 2, -4.7);
  });

  it('are empty where nothing is reached', () => {
    expect(reachOutline(gridOf(() => NaN))).toEqual([]);
  });
});

describe('edges between realms', () => {
  it('run along cell sides where the best robot changes, between reached cells only', () => {
    const map = gridOf((x, y) => (y > 500 ? NaN : 1));
    const owner = Uint8Array.from(map.value, (_, cell) => (cell % 41 < 20 ? 0 : 1));
    const edges = realmEdges(map, owner);
    const rows = 31;
    expect(edges).toHaveLength(rows * 4);
    for (let index = 0; index < edges.length; index += 4) {
      // Halfway between the centres of columns 19 and 20: −50 and 0 mm.
      expect(edges[index]).toBe(-25);
      expect(edges[index + 2]).toBe(-25);
      expect(edges[index + 3] - edges[index + 1]).toBe(50);
      expect(edges[index + 3]).toBeLessThanOrEqual(525);
    }
  });
});
