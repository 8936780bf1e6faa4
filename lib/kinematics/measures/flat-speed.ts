import { singularValues } from './singular-values';
import { makeBoundCorners, makeFacetNormals, type VelocitySet } from './velocity-set';

/** Gain, as a share of the largest, below which the set counts as flat across that direction. */
const FLAT = 1e-12;
/** Sine of the angle at which a direction counts as leaving a flat set. */
const ASIDE = 1e-9;

/**
 * The largest t with t·d in a set that is flat, as at a singular posture or for a chain with fewer joints than directions: zero for a
 * direction that leaves the set, else the exact speed within the set's own span (m/s). Allocates; meant for single postures.
 */
export function speedAlongFlat(set: VelocitySet, direction: ArrayLike<number>): number {
  const { map, dimensions: m, coordinates: k, actuators: n, bounds } = set;
  if (k === 0) return 0;
  const span = spanOf(map, m, k);
  const rank = span.length;
  let size = 0;
  for (let r = 0; r < m; r++) size += direction[r] * direction[r];
  size = Math.sqrt(size);
  const inSpan = span.map((axis) => axis.reduce((sum, value, r) => sum + (value * direction[r]) / size, 0));
  const aside = 1 - inSpan.reduce((sum, value) => sum + value * value, 0);
  if (rank === 0 || aside > ASIDE * ASIDE) return 0;

  const reduced = new Float64Array(rank * k);
  for (let i = 0; i < rank; i++)
    for (let j = 0; j < k; j++) reduced[i * k + j] = span[i].reduce((sum, value, r) => sum + value * map[r * k + j], 0);
  const flat: VelocitySet = { map: reduced, bounds, dimensions: rank, coordinates: k, actuators: n };
  const corners = makeBoundCorners(rank, k, n);
  const count = corners.find(flat);
  let least = Infinity;
  makeFacetNormals(
    rank,
    k,
    n,
  )(flat, (normal) => {
    let along = 0;
    for (let i = 0; i < rank; i++) along += normal[i] * inSpan[i];
    if (Math.abs(along) < ASIDE) return;
    let support = 0;
    for (let c = 0; c < count; c++) {
      let dot = 0;
      for (let i = 0; i < rank; i++) dot += normal[i] * corners.points[c * rank + i];
      support = Math.max(support, Math.abs(dot));
    }
    least = Math.min(least, support / Math.abs(along));
  });
  return Number.isFinite(least) ? least : 0;
}

/** Orthonormal basis of the directions that the set reaches into. */
function spanOf(map: Float64Array, m: number, k: number): number[][] {
  const turned = map.slice();
  const gains = new Float64Array(m);
  const turns = Float64Array.from({ length: m * m }, (_, i) => (i % (m + 1) === 0 ? 1 : 0));
  singularValues(turned, m, k, gains, turns);
  const rank = gains.filter((gain) => gain > FLAT * gains[0]).length;
  return Array.from({ length: rank }, (_, i) => Array.from(turns.subarray(i * m, (i + 1) * m)));
}
