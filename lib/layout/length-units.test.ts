import { describe, expect, it } from 'vitest';
import { lengthFigure, lengthWords, stepIn, toMm } from './length-units';

describe('lengths in the reader’s unit', () => {
  // An inch is exactly 25.4 mm (international yard and pound agreement, 1959).
  it('writes millimetres and inches', () => {
    expect(lengthWords(2500, 'mm')).toBe('2500\u00a0mm');
    expect(lengthWords(2500, 'in')).toBe('98.43\u00a0in');
    expect(lengthFigure(-25.4, 'in')).toBe('−1');
    expect(lengthFigure(0, 'in')).toBe('0');
  });

  it('brings typed inches back as they were typed', () => {
    for (let sixteenths = 1; sixteenths < 4000; sixteenths += 7) {
      const mm = toMm(sixteenths / 16, 'in');
      expect(Number(lengthFigure(mm, 'in', 4))).toBe(sixteenths / 16);
    }
  });

  it('steps by eighths', () => {
    expect(stepIn(50, 'mm')).toBe(50);
    expect(stepIn(50, 'in')).toBe(50.8);
    expect(stepIn(1, 'in')).toBe(3.175);
  });
});
