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
  let best: number[] = [];
  for (const matrix of generalPostures(chain)) {
    const rows = independentRows(matrix, chain.actuators);
    if (rows.length > best.length) best = rows;
  }
  return best;
}

/**
 * Rows that a pose has to match to count as reached: the point always; of the orientation what the arm says it controls, or all of it where
 * it says nothing and controls any; and in any case what no joint can change.
 */
export function rowsToMatch(arm: Arm, chain: Chain, controlled: readonly number[]): number[] {
  const turns = controlled.some((row) => row >= 3);
  return [0, 1, 2, 3, 4, 5].filter((row) => {
    if (row < 3 || controlled.includes(row)) return true;
    return arm.freedoms || !turns ? !canMove(chain, row) : true;
  });
}

function canMove(chain: Chain, row: number): boolean {
  return generalPostures(chain).some((matrix) =>
    matrix.subarray(row * chain.actuators, (row + 1) * chain.actuators).some((value) => Math.abs(value) > MOVES),
  );
}

/** Jacobians at three postures with different shares of each range, so that no two links line up by chance. */
function generalPostures(chain: Chain): Float64Array[] {
  const stance = makeStance(chain);
  return [0.31, 0.57, 0.79].map((share) => {
    const posture = Array.from(chain.min, (low, i) => low + (chain.max[i] - low) * ((share + 0.137 * i) % 1));
    return jacobian(chain, forward(chain, posture, stance), new Float64Array(6 * chain.actuators));
  });
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
