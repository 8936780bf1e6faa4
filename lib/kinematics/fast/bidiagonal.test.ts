import { expect, it } from 'vitest';
import { singularValues } from '../measures/singular-values';
import { seededRandom } from '../testing/random';
import { makeMatrixExtremes } from './bidiagonal';

const random = seededRandom(3);
const entry = () => 2 * random() - 1;
const identity = (k: number) => (k % 7 === 0 ? 1 : 0);

const KINDS: [string, (k: number, filled: Float64Array) => number][] = [
  ['full', entry],
  ['two rows alike to 1e-6', (k, filled) => (k >= 6 && k < 12 ? filled[k - 6] + 1e-6 * entry() : entry())],
  ['two rows alike to 1e-11', (k, filled) => (k >= 6 && k < 12 ? filled[k - 6] + 1e-11 * entry() : entry())],
  ['an empty column', (k) => (k % 6 === 2 ? 0 : entry())],
  ['half empty', () => (random() < 0.5 ? 0 : entry())],
  ['all values alike', (k) => 3 * identity(k)],
  ['all values nearly alike', (k) => identity(k) * (1 + 1e-9 * random())],
  ['nothing', () => 0],
];

it.each(KINDS)('extremes agree with one-sided Jacobi rotations: %s', (_, fill) => {
  const matrix = new Float64Array(36);
  const values = new Float64Array(6);
  const out = new Float64Array(2);
  const read = makeMatrixExtremes(matrix, out);
  for (let draw = 0; draw < 300; draw++) {
    for (let k = 0; k < 36; k++) matrix[k] = fill(k, matrix);
    const copy = matrix.slice();
    read();
    singularValues(copy, 6, 6, values);
    expect(Math.abs(out[0] - values[0])).toBeLessThanOrEqual(1e-10 * values[0]);
    expect(Math.abs(out[1] - values[5])).toBeLessThanOrEqual(1e-10 * values[0]);
  }
});
