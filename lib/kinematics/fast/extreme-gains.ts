import { singularValues } from '../measures/singular-values';

/** The three mutually bound numbers that a gauge of six vectors in space is asked for; see `write` offsets. */
export const LARGEST = 0;
export const SMALLEST = 1;

/** ICN·√(1 − r²) under which the cubic loses digits: below it the result would be off by more than about 1e-11 of itself. */
const ILL = 1e-4;

/**
 * Largest and smallest singular value of six vectors in space, given one after another. From the eigenvalues of the 3 × 3 Gram matrix in closed form
 * (Smith 1961) where those keep their digits, else by one-sided Jacobi rotations as the reference does.
 */
export function makeExtremeGains(vectors: Float64Array, out: Float64Array): () => void {
  const rows = new Float64Array(18);
  const values = new Float64Array(3);

  function byRotations() {
    for (let i = 0; i < 6; i++) for (let r = 0; r < 3; r++) rows[6 * r + i] = vectors[3 * i + r];
    singularValues(rows, 3, 6, values);
    out[LARGEST] = values[0];
    out[SMALLEST] = values[2];
  }

  return () => {
    const x0 = vectors[0];
    const y0 = vectors[1];
    const z0 = vectors[2];
    const x1 = vectors[3];
    const y1 = vectors[4];
    const z1 = vectors[5];
    const x2 = vectors[6];
    const y2 = vectors[7];
    const z2 = vectors[8];
    const x3 = vectors[9];
    const y3 = vectors[10];
    const z3 = vectors[11];
    const x4 = vectors[12];
    const y4 = vectors[13];
    const z4 = vectors[14];
    const x5 = vectors[15];
    const y5 = vectors[16];
    const z5 = vectors[17];
    const xx = x0 * x0 + x1 * x1 + x2 * x2 + (x3 * x3 + x4 * x4 + x5 * x5);
    const yy = y0 * y0 + y1 * y1 + y2 * y2 + (y3 * y3 + y4 * y4 + y5 * y5);
    const zz = z0 * z0 + z1 * z1 + z2 * z2 + (z3 * z3 + z4 * z4 + z5 * z5);
    const xy = x0 * y0 + x1 * y1 + x2 * y2 + (x3 * y3 + x4 * y4 + x5 * y5);
    const xz = x0 * z0 + x1 * z1 + x2 * z2 + (x3 * z3 + x4 * z4 + x5 * z5);
    const yz = y0 * z0 + y1 * z1 + y2 * z2 + (y3 * z3 + y4 * z4 + y5 * z5);
    const mean = (xx + yy + zz) / 3;
    const a = xx - mean;
    const b = yy - mean;
    const c = zz - mean;
    const off = xy * xy + xz * xz + yz * yz;
    const square = (a * a + b * b + c * c + 2 * off) / 6;
    const p = Math.sqrt(square);
    const half = (a * (b * c - yz * yz) - xy * (xy * c - yz * xz) + xz * (xy * yz - b * xz)) / (2 * square * p);
    const turn = Math.acos(half) / 3;
    const cosine = Math.cos(turn);
    const largest = mean + 2 * p * cosine;
    const smallest = mean - p * (cosine + Math.sqrt(3 * (1 - cosine * cosine)));
    // Also false where any of these is not a number.
    if (smallest * smallest * (1 - half * half) > ILL * ILL * largest * largest) {
      out[LARGEST] = Math.sqrt(largest);
      out[SMALLEST] = Math.sqrt(smallest);
    } else byRotations();
  };
}
