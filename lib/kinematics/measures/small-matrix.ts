/** Pivot, as a share of the largest entry, below which a small matrix counts as singular. */
const SINGULAR = 1e-12;

/**
 * Inverse of a k × k matrix (row after row in `matrix`, which is overwritten) into `inverse`, by Gauss-Jordan with row pivoting.
 * Returns false, with `inverse` of no use, where the matrix is singular.
 */
export function invertSmall(matrix: Float64Array, k: number, inverse: Float64Array): boolean {
  let scale = 0;
  for (let i = 0; i < k * k; i++) {
    scale = Math.max(scale, Math.abs(matrix[i]));
    inverse[i] = 0;
  }
  for (let i = 0; i < k; i++) inverse[i * k + i] = 1;
  for (let column = 0; column < k; column++) {
    let pivot = column;
    for (let row = column + 1; row < k; row++)
      if (Math.abs(matrix[row * k + column]) > Math.abs(matrix[pivot * k + column])) pivot = row;
    if (Math.abs(matrix[pivot * k + column]) <= SINGULAR * scale) return false;
    if (pivot !== column) {
      swapRows(matrix, pivot, column, k);
      swapRows(inverse, pivot, column, k);
    }
    const by = 1 / matrix[column * k + column];
    for (let m = 0; m < k; m++) {
      matrix[column * k + m] *= by;
      inverse[column * k + m] *= by;
    }
    for (let row = 0; row < k; row++) {
      if (row === column) continue;
      const factor = matrix[row * k + column];
      if (factor === 0) continue;
      for (let m = 0; m < k; m++) {
        matrix[row * k + m] -= factor * matrix[column * k + m];
        inverse[row * k + m] -= factor * inverse[column * k + m];
      }
    }
  }
  return true;
}

function swapRows(matrix: Float64Array, left: number, right: number, k: number) {
  for (let m = 0; m < k; m++) {
    const value = matrix[left * k + m];
    matrix[left * k + m] = matrix[right * k + m];
    matrix[right * k + m] = value;
  }
}

/** Every way to pick `size` of `count` indices, one pick after another. */
export function subsets(count: number, size: number): Uint8Array {
  const picks: number[] = [];
  const pick = (from: number, chosen: number[]) => {
    if (chosen.length === size) {
      picks.push(...chosen);
      return;
    }
    for (let i = from; i <= count - (size - chosen.length); i++) pick(i + 1, [...chosen, i]);
  };
  if (size >= 0 && size <= count) pick(0, []);
  return Uint8Array.from(picks);
}
