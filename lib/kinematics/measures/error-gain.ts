import { singularValues } from './singular-values';

/** Tool error for a stated joint error, to first order. Shifts in m, turns in rad. */
export interface ErrorGain {
  readonly shift: ErrorFigures;
  readonly turn: ErrorFigures;
}

export interface ErrorFigures {
  /** Along x, y, z, every joint off its own way by all it may: Σ |J_i| e_i. */
  readonly worstByAxis: readonly [number, number, number];
  /** The farthest of all directions: the length of the longest Σ ± J_i e_i. */
  readonly worst: number;
  /** Along x, y, z, joints independent of each other: √Σ (J_i e_i)². */
  readonly rootSumSquareByAxis: readonly [number, number, number];
  /** The same along its worst direction: the largest singular value of J diag(e). */
  readonly rootSumSquare: number;
}

/**
 * `jacobian`: 6 × n, row after row; `errors`: what joint (or actuator) i may be off by, rad or m, none below zero. First-order error
 * propagation; with n joints 2^(n−1) sums are tried.
 */
export function errorGain(jacobian: ArrayLike<number>, errors: readonly number[]): ErrorGain {
  return { shift: figuresOf(jacobian, errors, 0), turn: figuresOf(jacobian, errors, 3) };
}

/** Along one direction (x, y, z of the Jacobian's frame, any length above zero): Σ |d · J_i| e_i, m. */
export function worstErrorAlong(
  jacobian: ArrayLike<number>,
  errors: readonly number[],
  [x, y, z]: readonly [number, number, number],
): number {
  const n = errors.length;
  const size = Math.hypot(x, y, z);
  return errors.reduce((sum, error, i) => {
    const along = (x * jacobian[i] + y * jacobian[n + i] + z * jacobian[2 * n + i]) / size;
    return sum + Math.abs(along) * error;
  }, 0);
}

function figuresOf(jacobian: ArrayLike<number>, errors: readonly number[], from: number): ErrorFigures {
  const n = errors.length;
  const rows = [0, 1, 2].map((row) => errors.map((error, i) => jacobian[(from + row) * n + i] * error));
  const byAxis = (figure: (row: number[]) => number) => rows.map(figure) as [number, number, number];
  const values = new Float64Array(3);
  singularValues(Float64Array.from(rows.flat()), 3, n, values);
  return {
    worstByAxis: byAxis((row) => row.reduce((sum, value) => sum + Math.abs(value), 0)),
    worst: longestSum(rows),
    rootSumSquareByAxis: byAxis((row) => Math.hypot(...row)),
    rootSumSquare: values[0],
  };
}

/** The farthest corner of a set that is symmetric about zero, so that the first sign can stay. */
function longestSum(rows: readonly (readonly number[])[]): number {
  const moving = rows[0].map((_, i) => rows.map((row) => row[i])).filter((column) => column.some((v) => v !== 0));
  if (moving.length === 0) return 0;
  let worst = 0;
  for (let signs = 0; signs < 2 ** (moving.length - 1); signs++) {
    const sum = [0, 0, 0];
    moving.forEach((column, i) => {
      const sign = (signs >> i) & 1 ? -1 : 1;
      for (let row = 0; row < 3; row++) sum[row] += sign * column[row];
    });
    worst = Math.max(worst, Math.hypot(...sum));
  }
  return worst;
}
