import { describe, expect, it } from 'vitest';
import { seededRandom } from '../testing/random';
import { singularValues } from './singular-values';

describe('singular values', () => {
  it('keeps a gain of 1e-15 of the largest, where the eigenvalues of the Gram matrix lose it', () => {
    // Two rows that differ by 2e-15 · e: values √2 and √2 e (first order, derivable).
    for (const small of [1e-7, 1.5e-8, 1e-12]) {
      const rows = Float64Array.of(1, small, 1, -small);
      const values = new Float64Array(2);
      singularValues(rows, 2, 2, values);
      expect(values[0] / Math.SQRT2).toBeCloseTo(1, 12);
      expect(values[1] / (Math.SQRT2 * small)).toBeCloseTo(1, 8);
    }
  });

  it('has the product of the determinant and the sum of squares of the entries', () => {
    const random = seededRandom(3);
    for (let i = 0; i < 500; i++) {
      const m = Float64Array.from({ length: 9 }, () => random() - 0.5);
      const [a, b, c, d, e, f, g, h, k] = m;
      const determinant = Math.abs(a * (e * k - f * h) - b * (d * k - f * g) + c * (d * h - e * g));
      const squares = m.reduce((sum, value) => sum + value * value, 0);
      const values = new Float64Array(3);
      singularValues(m, 3, 3, values);
      expect(values[0]).toBeGreaterThanOrEqual(values[1]);
      expect(values[1]).toBeGreaterThanOrEqual(values[2]);
      expect(values[0] * values[1] * values[2]).toBeCloseTo(determinant, 13);
      expect(values[0] ** 2 + values[1] ** 2 + values[2] ** 2).toBeCloseTo(squares, 13);
    }
  });

  it('answers zeros for zeros and for more vectors than they have room', () => {
    const values = new Float64Array(3);
    singularValues(new Float64Array(9), 3, 3, values);
    expect([...values]).toEqual([0, 0, 0]);
    singularValues(Float64Array.of(1, 2, 3), 3, 1, values);
    expect(values[0]).toBeCloseTo(Math.sqrt(14), 14);
    expect(values[1]).toBeLessThan(1e-14);
  });
});
