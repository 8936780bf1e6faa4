/**
 * Singular values by one-sided Jacobi rotations (Hestenes 1958): the columns are turned until they are at right angles, their lengths are
 * the values. Small values keep their relative accuracy, which the eigenvalues of the Gram matrix lose.
 */

const SWEEPS = 40;
/** Columns this near to a right angle (cosine) count as turned. */
const RIGHT_ANGLE = 1e-15;

/**
 * Singular values of `count` vectors of length `length`, stored one after another in `vectors`, which is overwritten with the
 * turned vectors. Writes the lengths, largest first, to `values` and orders the vectors likewise. Needs no allocation.
 * `turns`: where given, `count` vectors of length `count` that are turned along; from the unit matrix they come out as the directions that
 * belong to the values (the left singular vectors of the matrix with `vectors` as rows), zero values included.
 */
export function singularValues(
  vectors: Float64Array,
  count: number,
  length: number,
  values: Float64Array,
  turns?: Float64Array,
): void {
  for (let sweep = 0; sweep < SWEEPS; sweep++) {
    let turned = false;
    for (let i = 0; i < count - 1; i++)
      for (let j = i + 1; j < count; j++) if (rotatePair(vectors, i, j, length, turns, count)) turned = true;
    if (!turned) break;
  }
  for (let i = 0; i < count; i++) {
    let sum = 0;
    for (let k = 0; k < length; k++) sum += vectors[i * length + k] * vectors[i * length + k];
    values[i] = Math.sqrt(sum);
  }
  order(vectors, count, length, values, turns);
}

function rotatePair(
  vectors: Float64Array,
  i: number,
  j: number,
  length: number,
  turns: Float64Array | undefined,
  count: number,
): boolean {
  const p = i * length;
  const q = j * length;
  let alpha = 0;
  let beta = 0;
  let gamma = 0;
  for (let k = 0; k < length; k++) {
    const x = vectors[p + k];
    const y = vectors[q + k];
    alpha += x * x;
    beta += y * y;
    gamma += x * y;
  }
  if (gamma === 0 || gamma * gamma <= RIGHT_ANGLE * RIGHT_ANGLE * alpha * beta) return false;
  const zeta = (beta - alpha) / (2 * gamma);
  const t = (zeta >= 0 ? 1 : -1) / (Math.abs(zeta) + Math.sqrt(1 + zeta * zeta));
  const c = 1 / Math.sqrt(1 + t * t);
  const s = c * t;
  turnPair(vectors, p, q, length, c, s);
  if (turns) turnPair(turns, i * count, j * count, count, c, s);
  return true;
}

function turnPair(vectors: Float64Array, p: number, q: number, length: number, c: number, s: number) {
  for (let k = 0; k < length; k++) {
    const x = vectors[p + k];
    const y = vectors[q + k];
    vectors[p + k] = c * x - s * y;
    vectors[q + k] = s * x + c * y;
  }
}

function order(vectors: Float64Array, count: number, length: number, values: Float64Array, turns?: Float64Array) {
  for (let i = 0; i < count - 1; i++) {
    let largest = i;
    for (let j = i + 1; j < count; j++) if (values[j] > values[largest]) largest = j;
    if (largest === i) continue;
    const value = values[i];
    values[i] = values[largest];
    values[largest] = value;
    swap(vectors, i * length, largest * length, length);
    if (turns) swap(turns, i * count, largest * count, count);
  }
}

function swap(vectors: Float64Array, p: number, q: number, length: number) {
  for (let k = 0; k < length; k++) {
    const entry = vectors[p + k];
    vectors[p + k] = vectors[q + k];
    vectors[q + k] = entry;
  }
}
