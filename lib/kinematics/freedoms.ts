import { forward, jacobian, makeStance, type Chain } from './chain';
import type { Arm, Freedom } from './types';

export const FREEDOMS: readonly Freedom[] = ['x', 'y', 'z', 'rx', 'ry', 'rz'];
const MOVES = 1e-9;

/**
 * The freedoms that a chain controls, as rows of the Jacobian (0 x … 5 rz). Named by the arm, else all six from six actuators on;
 * a shorter chain keeps, in this order, every row that moves at all and adds rank at a general posture.
 */
export function controlledFreedoms(arm: Arm, chain: Chain): number[] {
  if (arm.freedoms) return FREEDOMS.map((_, row) => row).filter((row) => arm.freedoms!.includes(FREEDOMS[row]));
  if (chain.actuators >= 6) return [0, 1, 2, 3, 4, 5];
  const stance = makeStance(chain);
  const columns = chain.actuators;
  const matrix = new Float64Array(6 * columns);
  let best: number[] = [];
  for (const share of [0.31, 0.57, 0.79]) {
    const posture = Array.from({ length: columns }, (_, i) => {
      // Different shares of each range, so that no two links line up by chance.
      const at = (share + 0.137 * i) % 1;
      return chain.min[i] + (chain.max[i] - chain.min[i]) * at;
    });
    jacobian(chain, forward(chain, posture, stance), matrix);
    const rows = independentRows(matrix, columns);
    if (rows.length > best.length) best = rows;
  }
  return best;
}

/** Rows that add rank, taken from the top, by Gram-Schmidt. */
function independentRows(matrix: Float64Array, columns: number): number[] {
  const kept: number[] = [];
  const basis: Float64Array[] = [];
  for (let row = 0; row < 6; row++) {
    const rest = matrix.slice(row * columns, (row + 1) * columns);
    const size = norm(rest);
    if (size < MOVES) continue;
    for (const axis of basis) {
      let dot = 0;
      for (let i = 0; i < columns; i++) dot += axis[i] * rest[i];
      for (let i = 0; i < columns; i++) rest[i] -= dot * axis[i];
    }
    const left = norm(rest);
    if (left < 1e-6 * size) continue;
    basis.push(rest.map((value) => value / left));
    kept.push(row);
  }
  return kept;
}

const norm = (values: Float64Array) => Math.hypot(...values);
