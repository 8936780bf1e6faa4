import { segmentsMeet, type PointMm } from '../geometry';

/** Outlines on the floor against one another, any unit. Outlines are closed and do not cross themselves. */

/** Whether a point lies inside an outline (even-odd rule). */
export function liesInside(outline: readonly PointMm[], x: number, y: number): boolean {
  let inside = false;
  for (let index = 0, last = outline.length - 1; index < outline.length; last = index, index += 1) {
    const [x1, y1] = outline[index];
    const [x2, y2] = outline[last];
    if (y1 > y !== y2 > y && x < ((x2 - x1) * (y - y1)) / (y2 - y1) + x1) inside = !inside;
  }
  return inside;
}

/** Whether two outlines share any floor; touching edges count. */
export function outlinesMeet(one: readonly PointMm[], other: readonly PointMm[]): boolean {
  if (liesInside(one, other[0][0], other[0][1]) || liesInside(other, one[0][0], one[0][1])) return true;
  return one.some((from, index) => {
    const to = one[(index + 1) % one.length];
    return other.some((start, place) => segmentsMeet(from, to, start, other[(place + 1) % other.length]));
  });
}

/** Distance of a point from a segment. */
export function distanceToSegment(x: number, y: number, [x1, y1]: PointMm, [x2, y2]: PointMm): number {
  const dx = x2 - x1;
  const dy = y2 - y1;
  const square = dx * dx + dy * dy;
  const along = square === 0 ? 0 : Math.min(1, Math.max(0, ((x - x1) * dx + (y - y1) * dy) / square));
  return Math.hypot(x - x1 - along * dx, y - y1 - along * dy);
}

/** Least distance of two segments; 0 where they meet. */
export function segmentDistance(a: PointMm, b: PointMm, c: PointMm, d: PointMm): number {
  if (segmentsMeet(a, b, c, d)) return 0;
  return Math.min(
    distanceToSegment(a[0], a[1], c, d),
    distanceToSegment(b[0], b[1], c, d),
    distanceToSegment(c[0], c[1], a, b),
    distanceToSegment(d[0], d[1], a, b),
  );
}

/** The sides of a line through points, closed or open. */
export function sidesOf(points: readonly PointMm[], closed: boolean): (readonly [PointMm, PointMm])[] {
  const count = closed ? points.length : points.length - 1;
  return Array.from({ length: count }, (_, index) => [points[index], points[(index + 1) % points.length]] as const);
}
