import type { Chain } from '../chain';
import { singularValues } from './singular-values';

/** How evenly a posture moves and turns the tool at once. */
export interface PoseCondition {
  /** Characteristic length (m) that turns were weighed with. */
  readonly lengthM: number;
  /** Smallest singular value over the largest, 0 … 1. */
  readonly inverseConditionNumber: number;
  /** Of the Jacobian with columns scaled by joint speed limits and turning rows by the length: m/s, largest first. */
  readonly singularValues: readonly number[];
}

/** Gives the condition of a posture by its Jacobian (6 × actuators, row after row, unscaled); without a length, with the best one. */
export type PoseConditioner = (jacobian: Float64Array, lengthM?: number) => PoseCondition;

/** Lengths that the best one is looked for between (m), how many are tried first, and golden sections after that. */
const SHORTEST = 1e-3;
const LONGEST = 1e3;
const TRIED = 121;
const SECTIONS = 60;
const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * Condition of the whole matrix of what the chain controls (`freedoms`: rows of the Jacobian), with a characteristic length so that shifts and turns
 * can be compared (Angeles). The best length is the one that makes the posture look best; where only shifts or only turns are
 * controlled any length will do.
 */
export function makePoseConditioner(chain: Chain, freedoms: readonly number[]): PoseConditioner {
  const n = chain.actuators;
  const count = freedoms.length;
  const rows = new Float64Array(count * n);
  const columns = new Float64Array(count * n);
  const values = new Float64Array(Math.max(count, n));
  const least = Math.min(count, n);

  function fill(jacobian: Float64Array, lengthM: number) {
    freedoms.forEach((row, r) => {
      const weight = row < 3 ? 1 : lengthM;
      for (let i = 0; i < n; i++) rows[r * n + i] = jacobian[row * n + i] * chain.maxSpeed[i] * weight;
    });
  }

  function inverseCondition(jacobian: Float64Array, lengthM: number): number {
    fill(jacobian, lengthM);
    if (count <= n) singularValues(rows, count, n, values);
    else {
      // Fewer joints than rows: the columns are turned, so that none of them is zero by number alone.
      for (let r = 0; r < count; r++) for (let i = 0; i < n; i++) columns[i * count + r] = rows[r * n + i];
      singularValues(columns, n, count, values);
    }
    return values[0] > 0 ? values[least - 1] / values[0] : 0;
  }

  function bestLength(jacobian: Float64Array): number {
    const mixed = freedoms.some((row) => row < 3) && freedoms.some((row) => row >= 3);
    if (!mixed) return 1;
    const step = Math.log(LONGEST / SHORTEST) / (TRIED - 1);
    const at = (logLength: number) => inverseCondition(jacobian, Math.exp(logLength));
    let best = 0;
    let most = -1;
    for (let k = 0; k < TRIED; k++) {
      const value = at(Math.log(SHORTEST) + k * step);
      if (value > most) [best, most] = [k, value];
    }
    let low = Math.log(SHORTEST) + (best - 1) * step;
    let high = low + 2 * step;
    for (let section = 0; section < SECTIONS; section++) {
      const left = high - GOLDEN * (high - low);
      const right = low + GOLDEN * (high - low);
      if (at(left) >= at(right)) high = right;
      else low = left;
    }
    return Math.exp((low + high) / 2);
  }

  return (jacobian, lengthM) => {
    if (lengthM !== undefined && !(lengthM > 0 && Number.isFinite(lengthM)))
      throw new RangeError('A characteristic length has to be above zero.');
    const length = lengthM ?? bestLength(jacobian);
    const inverseConditionNumber = inverseCondition(jacobian, length);
    return { lengthM: length, inverseConditionNumber, singularValues: Array.from(values.subarray(0, least)) };
  };
}
