import type { PointMm } from './geometry';

export interface Rectangle {
  readonly minX: number;
  readonly minY: number;
  readonly maxX: number;
  readonly maxY: number;
}

/** The rectangle that an outline is, its sides along the item's axes; null for any other outline. */
export function asRectangle(outline: readonly PointMm[]): Rectangle | null {
  if (outline.length !== 4) return null;
  const xs = [...new Set(outline.map(([x]) => x))].sort((one, other) => one - other);
  const ys = [...new Set(outline.map(([, y]) => y))].sort((one, other) => one - other);
  if (xs.length !== 2 || ys.length !== 2) return null;
  const isStepwise = outline.every(([x, y], index) => {
    const [nextX, nextY] = outline[(index + 1) % 4];
    return (x === nextX) !== (y === nextY);
  });
  return isStepwise ? { minX: xs[0], minY: ys[0], maxX: xs[1], maxY: ys[1] } : null;
}

/** Its corners, counter-clockwise from the lower left one. */
export function cornersOf({ minX, minY, maxX, maxY }: Rectangle): [number, number][] {
  return [
    [minX, minY],
    [maxX, minY],
    [maxX, maxY],
    [minX, maxY],
  ];
}

/** The rectangle round an outline. */
export function rectangleRound(outline: readonly PointMm[]): Rectangle {
  const xs = outline.map(([x]) => x);
  const ys = outline.map(([, y]) => y);
  return { minX: Math.min(...xs), minY: Math.min(...ys), maxX: Math.max(...xs), maxY: Math.max(...ys) };
}

/** A block that is handled as a rectangle: it is one, and its corners have not been set free. */
export function rectangleOf(item: {
  readonly outlineMm: readonly PointMm[];
  readonly cornersFree?: boolean;
}): Rectangle | null {
  return item.cornersFree ? null : asRectangle(item.outlineMm);
}
