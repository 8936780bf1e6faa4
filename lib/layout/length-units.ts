/** How lengths are written for a reader. What is stored is always millimetres; an inch is exactly 25.4 of them (since 1959). */
export type LengthUnit = 'mm' | 'in';

export const MM_PER_UNIT: Record<LengthUnit, number> = { mm: 1, in: 25.4 };

/** Digits after the point that an inch needs to say as much as a whole millimetre, or a hundredth of one. */
const MORE_DIGITS: Record<LengthUnit, number> = { mm: 0, in: 2 };

/** The number alone, without trailing zeros and with a true minus sign. `mmDigits` counts those of the millimetre. */
export function lengthFigure(mm: number, unit: LengthUnit, mmDigits = 2): string {
  const value = Number((mm / MM_PER_UNIT[unit]).toFixed(mmDigits + MORE_DIGITS[unit])) + 0;
  return String(value).replace('-', '\u2212');
}

/** The number with its unit: `2500 mm`, `98.43 in`. */
export function lengthWords(mm: number, unit: LengthUnit, mmDigits = 0): string {
  return `${lengthFigure(mm, unit, mmDigits)}\u00a0${unit}`;
}

/** Millimetres of a number in the unit; exact to a millionth, so that what is typed comes back as it was typed. */
export function toMm(value: number, unit: LengthUnit): number {
  return Math.round(value * MM_PER_UNIT[unit] * 1e6) / 1e6;
}

/** What an arrow key adds where a millimetre field would add `stepMm`: the nearest eighth of an inch, in millimetres. */
export function stepIn(stepMm: number, unit: LengthUnit): number {
  if (unit === 'mm') return stepMm;
  return toMm(Math.max(1, Math.round((stepMm / MM_PER_UNIT.in) * 8)) / 8, 'in');
}
