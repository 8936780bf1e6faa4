import type { Chain } from '../chain';
import type { WristMode } from '../types';
import { makeGauge, type Gauge } from './gauge';
import { nullSpace } from './null-space';
import { singularValues } from './singular-values';

/** A direction that the tool point moves in, and the joint speeds that do it. */
export interface PrincipalDirection {
  /** m/s, for joint speeds of length one as shares of their limits. */
  readonly gain: number;
  /** Unit vector over x, y, z; what the chain does not control is zero. */
  readonly tool: readonly [number, number, number];
  /** Joint (actuator) speeds as shares of their limits, a unit vector; null where no joint speeds are left to give (gain zero). */
  readonly joints: readonly number[] | null;
}

export interface PrincipalDirections {
  /** Largest gain first, one for each linear freedom. */
  readonly principal: readonly PrincipalDirection[];
  /** Joint speeds (shares of their limits, unit vectors at right angles) that move nothing of what is measured. */
  readonly still: readonly (readonly number[])[];
}

/** Gain, as a share of the largest, below which a direction counts as lost. */
const LOST = 1e-12;

/**
 * Singular value decomposition of one posture, with its vectors: U (tool), σ (gain), V (joints). `jacobian`: 6 × actuators, row after row,
 * unscaled. With the wrist held the joint speeds are those that turn nothing.
 */
export function principalDirections(
  chain: Chain,
  freedoms: readonly number[],
  mode: WristMode,
  jacobian: Float64Array,
): PrincipalDirections {
  const gauge = makeGauge(chain, freedoms, mode);
  gauge.readGains(jacobian);
  const { map, bounds, dimensions: m, coordinates: k, actuators: n } = gauge.velocitySet();
  const gains = new Float64Array(m);
  const turned = map.slice();
  const turns = Float64Array.from({ length: m * m }, (_, i) => (i % (m + 1) === 0 ? 1 : 0));
  singularValues(turned, m, k, gains, turns);
  const principal = Array.from(gains, (gain, i): PrincipalDirection => {
    const tool = inSpace(gauge, turns.subarray(i * m, (i + 1) * m));
    if (!(gain > LOST * gains[0])) return { gain, tool, joints: null };
    const v = Array.from(turned.subarray(i * k, (i + 1) * k), (value) => value / gain);
    return { gain, tool, joints: timesVector(bounds, n, k, v) };
  });
  return { principal, still: stillMotions(chain, freedoms, mode, jacobian) };
}

function timesVector(matrix: Float64Array, rows: number, columns: number, v: readonly number[]): number[] {
  return Array.from({ length: rows }, (_, r) => v.reduce((sum, value, j) => sum + matrix[r * columns + j] * value, 0));
}

function inSpace({ linearRows }: Gauge, tool: ArrayLike<number>): [number, number, number] {
  const out: [number, number, number] = [0, 0, 0];
  linearRows.forEach((row, i) => (out[row] = tool[i]));
  return out;
}

function stillMotions(chain: Chain, freedoms: readonly number[], mode: WristMode, jacobian: Float64Array): number[][] {
  const n = chain.actuators;
  const rows = freedoms.filter((row) => row < 3 || mode === 'held');
  const scaled = Float64Array.from(
    rows.flatMap((row) => Array.from(chain.maxSpeed, (speed, i) => jacobian[row * n + i] * speed)),
  );
  const out = new Float64Array(n * n);
  const count = nullSpace(scaled, rows.length, n, out, new Float64Array(n * n));
  return Array.from({ length: count }, (_, i) => Array.from(out.subarray(i * n, (i + 1) * n)));
}
