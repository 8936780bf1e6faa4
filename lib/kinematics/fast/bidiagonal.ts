import { squaredBidiagonal } from './squared-bidiagonal';

/**
 * Largest and smallest singular value of a 6 × 6 matrix: Householder reflections to two diagonals (Golub & Kahan 1965), then Laguerre's iteration on
 * the outermost eigenvalues, which comes from outside and never passes them. The smallest value comes as exact as the largest: about 1e-15 of the
 * largest, by differential quotients (Fernando & Parlett 1994) instead of the Gram matrix.
 */

const N = 6;
const MAX_STEPS = 60;
/** Relative step after which nothing is left to gain: the next would be its third power, or a good part of it where values crowd. */
const ARRIVED = 1e-10;
/** Steps are kept this much short: where values crowd, rounding could carry them past the outermost. */
const SHORT = 1 - 1e-7;

/** Reads `matrix` (row after row) and writes the two values to out[0] and out[1]. */
export function makeMatrixExtremes(matrix: Float64Array, out: Float64Array): () => void {
  /** Squares of the diagonal and of what stands right of it. */
  const q = new Float64Array(N);
  const e = new Float64Array(N);
  return () => {
    squaredBidiagonal(matrix, q, e);
    largestSquare(q, e, out);
    smallestSquare(q, e, out);
    out[0] = Math.sqrt(out[0]);
    out[1] = Math.sqrt(out[1]);
  };
}

/** The largest eigenvalue of BᵀB, from the bound by its trace and the trace of its square (Samuelson's inequality) downwards. */
function largestSquare(q: Float64Array, e: Float64Array, out: Float64Array) {
  let trace = 0;
  let squares = 0;
  for (let i = 0; i < N; i++) {
    const diagonal = q[i] + (i > 0 ? e[i - 1] : 0);
    trace += diagonal;
    squares += diagonal * diagonal + (i < N - 1 ? 2 * q[i] * e[i] : 0);
  }
  const mean = trace / N;
  let x = mean + Math.sqrt(Math.max(0, (N - 1) * (squares / N - mean * mean)));
  // The root above loses half its digits where all values are alike.
  x += 1e-7 * mean;
  for (let step = 0; step < MAX_STEPS; step++) {
    // Pivots of BᵀB − x and their first two derivatives by x give Σ 1/(x − λ) and Σ 1/(x − λ)².
    let d = q[0] - x;
    let d1 = -1;
    let d2 = 0;
    let inverse = 1 / d;
    let ratio = d1 * inverse;
    let sum = ratio;
    let sumSquares = ratio * ratio;
    for (let i = 1; i < N; i++) {
      const b = q[i - 1] * e[i - 1] * inverse;
      d = q[i] + e[i - 1] - x - b;
      // Of b = β²/d: b′ = −b r, b″ = b (2 r² − d″/d).
      const next1 = -1 + b * ratio;
      const next2 = -b * (2 * ratio * ratio - d2 * inverse);
      d1 = next1;
      d2 = next2;
      inverse = 1 / d;
      ratio = d1 * inverse;
      sum += ratio;
      sumSquares += ratio * ratio - d2 * inverse;
    }
    const root = Math.sqrt(Math.max(0, (N - 1) * (N * sumSquares - sum * sum)));
    const shift = (SHORT * N) / (sum + root);
    if (!(shift > 0)) break;
    x -= shift;
    if (shift <= ARRIVED * x) break;
  }
  out[0] = x;
}

/** The smallest eigenvalue of BᵀB, from zero upwards. */
function smallestSquare(q: Float64Array, e: Float64Array, out: Float64Array) {
  let x = 0;
  for (let step = 0; step < MAX_STEPS; step++) {
    let d = q[0] - x;
    let d1 = -1;
    let d2 = 0;
    let sum = 0;
    let sumSquares = 0;
    for (let i = 0; i < N - 1; i++) {
      // Q = d + e, t = q/Q, next d = d t − x.
      const inverse = 1 / (d + e[i]);
      const ratio = d1 * inverse;
      const bend = d2 * inverse;
      sum -= ratio;
      sumSquares += ratio * ratio - bend;
      const t = q[i + 1] * inverse;
      const t1 = -t * ratio;
      const t2 = t * (2 * ratio * ratio - bend);
      const next1 = d1 * t + d * t1 - 1;
      const next2 = d2 * t + 2 * d1 * t1 + d * t2;
      d = d * t - x;
      d1 = next1;
      d2 = next2;
    }
    if (!(d > 0)) break;
    const ratio = d1 / d;
    sum -= ratio;
    sumSquares += ratio * ratio - d2 / d;
    const root = Math.sqrt(Math.max(0, (N - 1) * (N * sumSquares - sum * sum)));
    const shift = (SHORT * N) / (sum + root);
    if (!(shift > 0)) break;
    x += shift;
    if (shift <= ARRIVED * x) break;
  }
  out[1] = x;
}
