import { makeGauge } from './measures/gauge';
import { makeSolver } from './solver';
import type { Arm, WristMode } from './types';

/** What to draw of a velocity set in a plane through the tool point: the polygon of the exact set and its ellipse (m/s). */
export interface VelocityOutline {
  /** Corners of the polytope's shadow on the plane, counter-clockwise. */
  readonly polygon: [number, number][];
  /** Shadow of the ellipsoid: half axes, the larger first, and the angle of that one from the plane's first axis (rad). */
  readonly ellipse: { readonly major: number; readonly minor: number; readonly angleRad: number };
}

export interface VelocityOutlines {
  /** On the floor plane: x, y. */
  readonly floor: VelocityOutline;
  /** On the upright plane through the given heading: level distance, height. */
  readonly upright: VelocityOutline;
}

/** `headingRad`: the level direction of the upright plane, for instance from the first axis to the tool. */
export function velocityOutlines(
  arm: Arm,
  posture: ArrayLike<number>,
  wrist: WristMode,
  headingRad: number,
): VelocityOutlines {
  const solver = makeSolver(arm);
  const gauge = makeGauge(solver.chain, solver.freedoms, wrist);
  gauge.read(solver.stand(posture));
  const { map, coordinates, dimensions } = gauge.velocitySet();
  const corners = gauge.corners();
  const outline = (first: number[], second: number[]): VelocityOutline => {
    // Rows of the plane's axes in the measured rows, which may be fewer than three.
    const [u, v] = [first, second].map((axis) => gauge.linearRows.map((row) => axis[row]));
    const points: [number, number][] = [];
    for (let c = 0; c < corners.length; c += dimensions) {
      const x = u.reduce((sum, share, row) => sum + share * corners[c + row], 0);
      const y = v.reduce((sum, share, row) => sum + share * corners[c + row], 0);
      points.push([x, y], [-x, -y]);
    }
    let xx = 0;
    let xy = 0;
    let yy = 0;
    for (let k = 0; k < coordinates; k++) {
      const x = u.reduce((sum, share, row) => sum + share * map[row * coordinates + k], 0);
      const y = v.reduce((sum, share, row) => sum + share * map[row * coordinates + k], 0);
      xx += x * x;
      xy += x * y;
      yy += y * y;
    }
    return { polygon: convexHull(points), ellipse: ellipseOf(xx, xy, yy) };
  };
  return {
    floor: outline([1, 0, 0], [0, 1, 0]),
    upright: outline([Math.cos(headingRad), Math.sin(headingRad), 0], [0, 0, 1]),
  };
}

/** Half axes of { v : v = G y, |y| ≤ 1 } from G Gᵀ. Drawn, never measured with: the square root costs digits. */
function ellipseOf(xx: number, xy: number, yy: number) {
  const middle = (xx + yy) / 2;
  const spread = Math.hypot((xx - yy) / 2, xy);
  return {
    major: Math.sqrt(middle + spread),
    minor: Math.sqrt(Math.max(0, middle - spread)),
    angleRad: 0.5 * Math.atan2(2 * xy, xx - yy),
  };
}

/** Andrew's monotone chain (1979). */
function convexHull(points: [number, number][]): [number, number][] {
  const sorted = [...points].sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const half = (list: [number, number][]) => {
    const hull: [number, number][] = [];
    for (const p of list) {
      while (hull.length >= 2 && turn(hull[hull.length - 2], hull[hull.length - 1], p) <= 1e-12) hull.pop();
      hull.push(p);
    }
    return hull.slice(0, -1);
  };
  return [...half(sorted), ...half(sorted.reverse())];
}

function turn(o: [number, number], a: [number, number], b: [number, number]): number {
  return (a[0] - o[0]) * (b[1] - o[1]) - (a[1] - o[1]) * (b[0] - o[0]);
}
