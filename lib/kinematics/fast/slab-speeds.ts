import { subsets } from '../measures/small-matrix';
import { MAXIMUM, SURE } from './zonotope-speeds';

/** Slack of the test whether a crossing of bounds is a corner, as in measures/velocity-set. */
const CORNER_SLACK = 1e-9;
/** Squared determinant of three unit vectors below which their planes count as meeting nowhere. */
const SINGULAR_SQUARE = 1e-24;

/**
 * Farthest corner and nearest facet of {v : |a_i · v| ≤ 1} for six vectors in space. A corner lies where three bounds cross; whether the other
 * three hold there is told by the twenty determinants of the vectors alone.
 */
export function makeSlabSpeeds(vectors: Float64Array, out: Float64Array): () => void {
  const triples = subsets(6, 3);
  const lookup = determinantTable(triples);
  /** The determinants, then their negatives. */
  const det = new Float64Array(40);
  const squares = new Float64Array(6);

  return () => {
    let longest = 0;
    for (let i = 0; i < 18; i += 3) {
      const square = vectors[i] * vectors[i] + vectors[i + 1] * vectors[i + 1] + vectors[i + 2] * vectors[i + 2];
      squares[i / 3] = square;
      if (square > longest) longest = square;
    }
    out[SURE] = 1 / Math.sqrt(longest);
    for (let t = 0; t < 20; t++) {
      const i = 3 * triples[3 * t];
      const j = 3 * triples[3 * t + 1];
      const k = 3 * triples[3 * t + 2];
      const value =
        vectors[i] * (vectors[j + 1] * vectors[k + 2] - vectors[j + 2] * vectors[k + 1]) +
        vectors[i + 1] * (vectors[j + 2] * vectors[k] - vectors[j] * vectors[k + 2]) +
        vectors[i + 2] * (vectors[j] * vectors[k + 1] - vectors[j + 1] * vectors[k]);
      det[t] = value;
      det[t + 20] = -value;
    }
    let farthest = 0;
    for (let t = 0; t < 20; t++) {
      const limit = Math.abs(det[t]) * (1 + CORNER_SLACK);
      const size = squares[triples[3 * t]] * squares[triples[3 * t + 1]] * squares[triples[3 * t + 2]];
      if (!(det[t] * det[t] > SINGULAR_SQUARE * size)) continue;
      let at = 9 * t;
      // Bit s is set while the corner of sign pattern s holds: signs (+ + +), (+ − +), (+ + −), (+ − −).
      let open = 15;
      for (let other = 0; other < 3 && open !== 0; other++, at += 3) {
        const p = det[lookup[at]];
        const q = det[lookup[at + 1]];
        const r = det[lookup[at + 2]];
        const sum = p + q;
        const difference = p - q;
        if (Math.abs(sum + r) > limit) open &= ~1;
        if (Math.abs(difference + r) > limit) open &= ~2;
        if (Math.abs(sum - r) > limit) open &= ~4;
        if (Math.abs(difference - r) > limit) open &= ~8;
      }
      if (open === 0) continue;
      const i = 3 * triples[3 * t];
      const j = 3 * triples[3 * t + 1];
      const k = 3 * triples[3 * t + 2];
      const ax = vectors[i];
      const ay = vectors[i + 1];
      const az = vectors[i + 2];
      const bx = vectors[j];
      const by = vectors[j + 1];
      const bz = vectors[j + 2];
      const cx = vectors[k];
      const cy = vectors[k + 1];
      const cz = vectors[k + 2];
      // Rows of the inverse: b × c, c × a, a × b over the determinant.
      const px = by * cz - bz * cy;
      const py = bz * cx - bx * cz;
      const pz = bx * cy - by * cx;
      const qx = cy * az - cz * ay;
      const qy = cz * ax - cx * az;
      const qz = cx * ay - cy * ax;
      const rx = ay * bz - az * by;
      const ry = az * bx - ax * bz;
      const rz = ax * by - ay * bx;
      const base = px * px + py * py + pz * pz + (qx * qx + qy * qy + qz * qz) + (rx * rx + ry * ry + rz * rz);
      const pq = 2 * (px * qx + py * qy + pz * qz);
      const pr = 2 * (px * rx + py * ry + pz * rz);
      const qr = 2 * (qx * rx + qy * ry + qz * rz);
      let far = 0;
      if (open & 1) far = base + pq + pr + qr;
      if (open & 2) far = Math.max(far, base - pq + pr - qr);
      if (open & 4) far = Math.max(far, base + pq - pr - qr);
      if (open & 8) far = Math.max(far, base - pq - pr + qr);
      farthest = Math.max(farthest, far / (det[t] * det[t]));
    }
    out[MAXIMUM] = Math.sqrt(farthest);
  };
}

/**
 * For each triple (i, j, k) and each other m: where det(m, j, k), det(i, m, k) and det(i, j, m) stand in the list of determinants, twenty
 * on where an odd permutation turns the sign.
 */
function determinantTable(triples: Uint8Array): Uint8Array {
  const placeOf = (a: number, b: number, c: number): number => {
    const sorted = [a, b, c].sort((left, right) => left - right);
    let place = 0;
    while (sorted.some((value, n) => value !== triples[3 * place + n])) place++;
    const odd = (a > b ? 1 : 0) + (a > c ? 1 : 0) + (b > c ? 1 : 0);
    return place + (odd % 2 === 1 ? 20 : 0);
  };
  const table: number[] = [];
  for (let t = 0; t < 20; t++) {
    const [i, j, k] = triples.subarray(3 * t, 3 * t + 3);
    for (let m = 0; m < 6; m++)
      if (m !== i && m !== j && m !== k) table.push(placeOf(m, j, k), placeOf(i, m, k), placeOf(i, j, m));
  }
  return Uint8Array.from(table);
}
