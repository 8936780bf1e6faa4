import type { PointMm } from './geometry';

/** Both edges of a way along its middle line, as two polylines with mitred corners. */
export function walkwayEdges(pointsMm: readonly PointMm[], widthMm: number): [PointMm[], PointMm[]] {
  const left: PointMm[] = [];
  const right: PointMm[] = [];
  pointsMm.forEach(([x, y], index) => {
    const before = pointsMm[Math.max(index - 1, 0)];
    const after = pointsMm[Math.min(index + 1, pointsMm.length - 1)];
    const inward = index === 0 ? null : Math.atan2(y - before[1], x - before[0]);
    const outward = index === pointsMm.length - 1 ? null : Math.atan2(after[1] - y, after[0] - x);
    const first = inward ?? outward ?? 0;
    const second = outward ?? first;
    const bend = Math.atan2(Math.sin(second - first), Math.cos(second - first)) / 2;
    const normal = first + bend + Math.PI / 2;
    // A hairpin would throw its mitre to infinity; three widths are as far as it goes.
    const reach = (widthMm / 2) * Math.min(1 / Math.max(Math.cos(bend), 1e-6), 3);
    left.push([x + reach * Math.cos(normal), y + reach * Math.sin(normal)]);
    right.push([x - reach * Math.cos(normal), y - reach * Math.sin(normal)]);
  });
  return [left, right];
}
