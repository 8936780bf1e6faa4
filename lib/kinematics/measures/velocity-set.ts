import { nullSpace } from './null-space';
import { invertSmall, subsets } from './small-matrix';

/**
 * The tool velocities that joint speeds within their limits can make: { M y : |N_i · y| ≤ 1 }. Wrist free, y are the scaled
 * joint speeds themselves (N = identity) and the set is the zonotope of M's columns. Wrist held, y are coordinates in the null
 * space of the angular rows, so the set is exact at singular postures and for redundant chains too (Kokkinis & Paden 1989; Chiacchio et
 * al. 1996). All methods work in scratch space made once.
 */
export interface VelocitySet {
  /** m × k, row after row: generators by column. */
  readonly map: Float64Array;
  /** n × k, row after row. */
  readonly bounds: Float64Array;
  readonly dimensions: number;
  readonly coordinates: number;
  readonly actuators: number;
}

/** Slack of the test whether a crossing of bounds is a corner. */
const CORNER_SLACK = 1e-9;

/** Corners of the set as m numbers each, one half of each ± pair; returns how many were written. */
export type CornerWriter = (set: VelocitySet) => number;

export interface Corners {
  readonly points: Float64Array;
  readonly find: CornerWriter;
}

/** Corners of a zonotope are among the 2^(k−1) sign sums; a Gray code changes one sign at a time. */
export function makeSignCorners(dimensions: number, actuators: number): Corners {
  const total = 2 ** (actuators - 1);
  const points = new Float64Array(total * dimensions);
  const signs = new Int8Array(actuators);
  const find: CornerWriter = ({ map }) => {
    signs.fill(1);
    for (let row = 0; row < dimensions; row++) {
      let sum = 0;
      for (let i = 0; i < actuators; i++) sum += map[row * actuators + i];
      points[row] = sum;
    }
    for (let step = 1; step < total; step++) {
      const flipped = 31 - Math.clz32(step & -step);
      const twice = -2 * signs[flipped];
      signs[flipped] = -signs[flipped] as -1 | 1;
      for (let row = 0; row < dimensions; row++)
        points[step * dimensions + row] =
          points[(step - 1) * dimensions + row] + twice * map[row * actuators + flipped];
    }
    return total;
  };
  return { points, find };
}

/** Corners where k bounds cross and all others hold. */
export function makeBoundCorners(dimensions: number, coordinates: number, actuators: number): Corners {
  const k = coordinates;
  const picks = subsets(actuators, k);
  const patterns = 2 ** Math.max(0, k - 1);
  const points = new Float64Array(Math.max(1, (picks.length / Math.max(1, k)) * patterns) * dimensions);
  const square = new Float64Array(k * k);
  const inverse = new Float64Array(k * k);
  const y = new Float64Array(k);
  const find: CornerWriter = ({ map, bounds }) => {
    let count = 0;
    for (let pick = 0; pick < picks.length; pick += k) {
      for (let i = 0; i < k; i++) for (let j = 0; j < k; j++) square[i * k + j] = bounds[picks[pick + i] * k + j];
      if (!invertSmall(square, k, inverse)) continue;
      for (let pattern = 0; pattern < patterns; pattern++) {
        for (let row = 0; row < k; row++) {
          let sum = inverse[row * k];
          for (let j = 1; j < k; j++) sum += pattern & (1 << (j - 1)) ? -inverse[row * k + j] : inverse[row * k + j];
          y[row] = sum;
        }
        if (!withinBounds(bounds, actuators, k, y)) continue;
        for (let row = 0; row < dimensions; row++) {
          let sum = 0;
          for (let j = 0; j < k; j++) sum += map[row * k + j] * y[j];
          points[count * dimensions + row] = sum;
        }
        count++;
      }
    }
    return count;
  };
  return { points, find };
}

function withinBounds(bounds: Float64Array, actuators: number, k: number, y: Float64Array): boolean {
  for (let i = 0; i < actuators; i++) {
    let sum = 0;
    for (let j = 0; j < k; j++) sum += bounds[i * k + j] * y[j];
    if (Math.abs(sum) > 1 + CORNER_SLACK) return false;
  }
  return true;
}

/**
 * Directions that hold every facet normal of the set, and maybe more: n with Mᵀ n in the span of k − m + 1 bounds. Calls `visit`
 * with each unit direction and the actuator that it is a bound of, or −1 where several bind together.
 */
export type FacetNormals = (set: VelocitySet, visit: (normal: Float64Array, actuator: number) => void) => void;

export function makeFacetNormals(dimensions: number, coordinates: number, actuators: number): FacetNormals {
  const m = dimensions;
  const k = coordinates;
  if (k < m) return () => {};
  const size = k - m + 1;
  const picks = subsets(actuators, size);
  const unknowns = m + size;
  const system = new Float64Array(k * unknowns);
  const solution = new Float64Array(unknowns * unknowns);
  const scratch = new Float64Array(unknowns * unknowns);
  const normal = new Float64Array(m);
  return (set, visit) => {
    for (let pick = 0; pick < picks.length; pick += size) {
      for (let row = 0; row < k; row++) {
        for (let j = 0; j < m; j++) system[row * unknowns + j] = set.map[j * k + row];
        for (let s = 0; s < size; s++) system[row * unknowns + m + s] = -set.bounds[picks[pick + s] * k + row];
      }
      // More than one solution: the bounds picked are dependent, and other picks give their facets.
      if (nullSpace(system, k, unknowns, solution, scratch) !== 1) continue;
      let length = 0;
      for (let j = 0; j < m; j++) length += solution[j] ** 2;
      length = Math.sqrt(length);
      if (length < 1e-13) continue;
      for (let j = 0; j < m; j++) normal[j] = solution[j] / length;
      visit(normal, size === 1 ? picks[pick] : -1);
    }
  };
}

/** Facet normals of a three-dimensional zonotope: the cross products of its generators, null ones skipped. */
export function makeCrossNormals(actuators: number): FacetNormals {
  const normal = new Float64Array(3);
  return ({ map }, visit) => {
    const n = actuators;
    for (let i = 0; i < n - 1; i++)
      for (let j = i + 1; j < n; j++) {
        const ax = map[i];
        const ay = map[n + i];
        const az = map[2 * n + i];
        const bx = map[j];
        const by = map[n + j];
        const bz = map[2 * n + j];
        const x = ay * bz - az * by;
        const y = az * bx - ax * bz;
        const z = ax * by - ay * bx;
        const length = Math.sqrt(x * x + y * y + z * z);
        if (length <= 1e-13 * Math.sqrt((ax * ax + ay * ay + az * az) * (bx * bx + by * by + bz * bz))) continue;
        normal[0] = x / length;
        normal[1] = y / length;
        normal[2] = z / length;
        visit(normal, -1);
      }
  };
}
