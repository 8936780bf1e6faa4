import { describe, expect, it } from 'vitest';
import { scara } from '@/lib/kinematics/library/scara';
import { errorGainAnswer, errorGainRows } from './error-gain';
import type { ErrorGainQuestion } from './question';

const arm = scara({
  innerLink: 0.5,
  outerLink: 0.4,
  column: 0.5,
  stroke: 0.4,
  limits: [[-180, 180], [-180, 180], [-180, 180]],
  speeds: [300, 400, 700],
  ramps: [1500, 2000, 4000],
  quillSpeed: 1,
  quillRamp: 10,
}); // prettier-ignore

const question = (change: Partial<ErrorGainQuestion> = {}): ErrorGainQuestion => ({
  study: 'errorGain',
  armId: '00000000-0000-4000-8000-0000000000aa',
  tool: { xMm: 0, yMm: 0, zMm: 0, rollDeg: 0, pitchDeg: 0, yawDeg: 0 },
  wrist: 'free',
  robot: { xMm: 2000, yMm: 1000, angleDeg: 0, riserMm: 0 },
  toolHeightMm: 300,
  tiltDeg: 0,
  towards: 'outward',
  headingDeg: 0,
  rollDeg: 'free',
  turnErrorDeg: 0.1,
  slideErrorMm: 0,
  grid: { originMm: [2000, 1000], stepMm: 100, columns: 12, rows: 1 },
  ...change,
});

/**
 * Two links l1, l2 with joint errors e: the tool is off by |J1 e ± J2 e|, |J1| = r (distance from the base), |J2| = l2, and with
 * the cosine between the two from the triangle: J1 · J2 = r l2 cos β = (r² + l2² − l1²) / 2. So the worst is
 * e √(r² + l2² + |r² + l2² − l1²|). Derived here; first-order error propagation.
 */
const worst = (r: number, e: number): number => e * Math.sqrt(r * r + 0.16 + Math.abs(r * r + 0.16 - 0.25));

describe('the error gain map', () => {
  it('of two links is the closed form at every distance', () => {
    const { values } = errorGainRows(question(), arm, 0, 1);
    const e = (0.1 * Math.PI) / 180;
    values.forEach((value, column) => {
      const r = column / 10;
      if (r < 0.1 - 1e-9 || r > 0.9 + 1e-9) expect(value).toBe(-1);
      // The very edges of reach lie within rounding; inside of them the form holds.
      else if (r > 0.1 + 1e-9 && r < 0.9 - 1e-9) expect(value).toBeCloseTo(1000 * worst(r, e), 4);
    });
  });

  it('grows with the stated error and does not care how its rows are cut', () => {
    const grid = { originMm: [1200, 200] as [number, number], stepMm: 200, columns: 9, rows: 9 };
    const small = errorGainAnswer([errorGainRows(question({ grid }), arm, 0, 9)]);
    const cut = [errorGainRows(question({ grid }), arm, 0, 4), errorGainRows(question({ grid }), arm, 4, 9)];
    expect(errorGainAnswer(cut)).toEqual(small);
    const double = errorGainAnswer([errorGainRows(question({ grid, turnErrorDeg: 0.2 }), arm, 0, 9)]);
    expect(double.most!).toBeCloseTo(2 * small.most!, 4);
    expect(small.least!).toBeLessThanOrEqual(small.median!);
  });
});
