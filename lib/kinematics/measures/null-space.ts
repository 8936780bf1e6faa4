/** Share of the longest row below which a row left over by Gram-Schmidt counts as nothing: the rank decision. */
const RANK_TOLERANCE = 1e-12;

/**
 * Orthonormal basis of the null space of a `rows` × `columns` matrix (row after row in `matrix`): writes `columns` − rank vectors one
 * after another to `out` and returns their count. `scratch` holds columns² numbers. Pivoted Gram-Schmidt, each step done
 * twice ("twice is enough", Parlett 1980), so the vectors are at right angles to rounding.
 */
export function nullSpace(
  matrix: Float64Array,
  rows: number,
  columns: number,
  out: Float64Array,
  scratch: Float64Array,
): number {
  const rank = rowBasis(matrix, rows, columns, scratch);
  let found = 0;
  // The unit vector with the most left outside the span so far starts the next basis vector.
  while (rank + found < columns) {
    let best = -1;
    let most = -1;
    for (let e = 0; e < columns; e++) {
      let inside = 0;
      for (let b = 0; b < rank; b++) inside += scratch[b * columns + e] ** 2;
      for (let b = 0; b < found; b++) inside += out[b * columns + e] ** 2;
      if (1 - inside > most) {
        most = 1 - inside;
        best = e;
      }
    }
    const start = found * columns;
    for (let k = 0; k < columns; k++) out[start + k] = k === best ? 1 : 0;
    for (let pass = 0; pass < 2; pass++) {
      removeSpan(out, start, scratch, rank, columns);
      removeSpan(out, start, out, found, columns);
      scaleToUnit(out, start, columns);
    }
    found++;
  }
  return found;
}

/** Orthonormal basis of the row space into `basis`, longest remaining row first; returns the rank. */
function rowBasis(matrix: Float64Array, rows: number, columns: number, basis: Float64Array): number {
  let rank = 0;
  let scale = 0;
  let used = 0;
  while (rank < rows && rank < columns) {
    let best = -1;
    let most = 0;
    for (let r = 0; r < rows; r++) {
      if (used & (1 << r)) continue;
      const left = lengthOutside(matrix, r * columns, basis, rank, columns);
      if (left > most) {
        most = left;
        best = r;
      }
    }
    if (rank === 0) scale = most;
    if (best < 0 || most <= RANK_TOLERANCE * scale) break;
    used |= 1 << best;
    const start = rank * columns;
    for (let k = 0; k < columns; k++) basis[start + k] = matrix[best * columns + k];
    for (let pass = 0; pass < 2; pass++) {
      removeSpan(basis, start, basis, rank, columns);
      scaleToUnit(basis, start, columns);
    }
    rank++;
  }
  return rank;
}

function lengthOutside(matrix: Float64Array, at: number, basis: Float64Array, rank: number, columns: number): number {
  let sum = 0;
  for (let k = 0; k < columns; k++) {
    let value = matrix[at + k];
    for (let b = 0; b < rank; b++) {
      let dot = 0;
      for (let m = 0; m < columns; m++) dot += matrix[at + m] * basis[b * columns + m];
      value -= dot * basis[b * columns + k];
    }
    sum += value * value;
  }
  return Math.sqrt(sum);
}

function removeSpan(vectors: Float64Array, at: number, basis: Float64Array, count: number, columns: number) {
  for (let b = 0; b < count; b++) {
    let dot = 0;
    for (let k = 0; k < columns; k++) dot += vectors[at + k] * basis[b * columns + k];
    for (let k = 0; k < columns; k++) vectors[at + k] -= dot * basis[b * columns + k];
  }
}

function scaleToUnit(vectors: Float64Array, at: number, columns: number) {
  let sum = 0;
  for (let k = 0; k < columns; k++) sum += vectors[at + k] * vectors[at + k];
  const length = Math.sqrt(sum);
  for (let k = 0; k < columns; k++) vectors[at + k] /= length;
}
