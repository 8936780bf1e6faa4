import { describe, expect, it } from 'vitest';
import { lumaOf, wallPoints } from './wall-points';

/** A picture of a dark rectangle on paper, each pixel as dark as the share of it that the rectangle covers. */
function picture(width: number, height: number, [x1, y1, x2, y2]: number[]): number[] {
  const rgba: number[] = [];
  const share = (from: number, to: number, at: number) => Math.max(0, Math.min(to, at + 1) - Math.max(from, at));
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const grey = 250 - 220 * share(x1, x2, x) * share(y1, y2, y);
      rgba.push(grey, grey, grey, 255);
    }
  }
  return rgba;
}

const sorted = (points: { x: number; y: number }[]) => points.sort((one, other) => one.y - other.y || one.x - other.x);

describe('corners of a floor plan', () => {
  it('finds the four corners of a wall to half a pixel', () => {
    const drawn = [30.25, 40.5, 90.75, 70.125];
    const points = sorted(wallPoints(lumaOf(picture(128, 100, drawn), 128, 100), 50));
    expect(points).toHaveLength(4);
    const [x1, y1, x2, y2] = drawn;
    const corners = [
      [x1, y1],
      [x2, y1],
      [x1, y2],
      [x2, y2],
    ];
    const found = points.map(({ x, y }) => corners.find(([cx, cy]) => Math.hypot(x - cx, y - cy) < 0.5));
    expect(new Set(found).size).toBe(4);
    expect(found).not.toContain(undefined);
  });

  it('finds nothing along a straight edge, nor on bare paper', () => {
    expect(wallPoints(lumaOf(picture(80, 80, [-10, 30, 90, 50]), 80, 80), 50)).toEqual([]);
    expect(wallPoints(lumaOf(picture(80, 80, [0, 0, 0, 0]), 80, 80), 50)).toEqual([]);
  });

  it('answers no more than it is asked for', () => {
    expect(wallPoints(lumaOf(picture(128, 100, [30, 40, 90, 70]), 128, 100), 2)).toHaveLength(2);
  });

  it('takes clear pixels for white paper', () => {
    expect(lumaOf([0, 0, 0, 0, 0, 0, 0, 255], 2, 1).values).toEqual(new Uint8Array([255, 0]));
  });
});
