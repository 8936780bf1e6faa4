import { signedAreaMm2, type PointMm } from '../geometry';

/**
 * Floor that two convex outlines share, as an outline; empty where they share none (Sutherland & Hodgman 1974). Any unit.
 */
export function convexOverlap(one: readonly PointMm[], other: readonly PointMm[]): PointMm[] {
  const clip = signedAreaMm2(other) < 0 ? [...other].reverse() : other;
  let kept: PointMm[] = [...one];
  clip.forEach((from, index) => {
    const to = clip[(index + 1) % clip.length];
    const side = ([x, y]: PointMm): number => (to[0] - from[0]) * (y - from[1]) - (to[1] - from[1]) * (x - from[0]);
    kept = kept.flatMap((point, at): PointMm[] => {
      const next = kept[(at + 1) % kept.length];
      const [here, there] = [side(point), side(next)];
      const own: PointMm[] = here >= 0 ? [point] : [];
      if (here >= 0 === there >= 0) return own;
      const share = here / (here - there);
      return [...own, [point[0] + share * (next[0] - point[0]), point[1] + share * (next[1] - point[1])]];
    });
  });
  return kept.length < 3 ? [] : kept;
}

export const overlapAreaM2 = (outlineMm: readonly PointMm[]): number =>
  outlineMm.length < 3 ? 0 : Math.abs(signedAreaMm2(outlineMm)) / 1e6;
