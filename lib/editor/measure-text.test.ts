import { describe, expect, it } from 'vitest';
import { parseMeasure, placeWords, printed, printedFixed } from './measure-text';

describe('typed measures', () => {
  // An inch is exactly 25.4 mm (international yard and pound agreement, 1959).
  it.each([
    ['2500', 2500],
    ['2.5 m', 2500],
    ['2,5m', 2500],
    ['98 in', 2489.2],
    ['12"', 304.8],
    ['1200 + 350', 1550],
    ['1 m - 5 cm', 950],
    ['−17', -17],
    ['1 250.5', 1250.5],
    ['.5', 0.5],
  ])('reads %s as %d mm', (text, value) => expect(parseMeasure(text, 'length')).toEqual({ ok: true, value }));

  it.each(['', 'abc', '12 kg', '1..2', '3 4 x', '5 5 +', '--3', '1e5'])('refuses "%s"', (text) =>
    expect(parseMeasure(text, 'length').ok).toBe(false),
  );

  it('takes degrees for angles only', () => {
    expect(parseMeasure('−17°', 'angle')).toEqual({ ok: true, value: -17 });
    expect(parseMeasure('17 mm', 'angle').ok).toBe(false);
    expect(parseMeasure('17°', 'length').ok).toBe(false);
  });

  it('prints without trailing zeros and with a true minus sign', () => {
    expect([1250, 0.5, -17.25, -0.001].map((value) => printed(value))).toEqual(['1250', '0.5', '−17.25', '0']);
    expect(printedFixed(-1.5, 2)).toBe('−1.50');
    expect(placeWords({ xMm: 3720.4, yMm: 3920, angleDeg: -17 })).toBe('x 3720 y 3920 −17°');
  });
});
