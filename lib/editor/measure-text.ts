import { lengthFigure, MM_PER_UNIT, type LengthUnit } from '@/lib/layout/length-units';

/** Between what people type and read and the numbers of the sheet. */

const MM_PER: Record<string, number> = { mm: 1, cm: 10, m: 1000, in: 25.4, '"': 25.4 };

export type Parsed = { readonly ok: true; readonly value: number } | { readonly ok: false; readonly message: string };

const TERM = /^([+-]?)(\d+(?:\.\d+)?|\.\d+)(mm|cm|m|in|"|°|deg)?/;

/**
 * Reads a length in mm or an angle in degrees: `2500`, `2.5 m`, `98 in`, `1200 + 350`. A number without a unit is in the
 * field's own: millimetres, or what `unit` says. The minus sign of the trade's print (U+2212) and a decimal comma are understood.
 */
export function parseMeasure(text: string, kind: 'length' | 'angle' | 'number', unit: LengthUnit = 'mm'): Parsed {
  let rest = text
    .replace(/[\s\u00a0\u2009\u202f]/g, '')
    .replace(/[\u2212\u2013]/g, '-')
    .replace(/,/g, '.')
    .toLowerCase();
  if (rest === '') return { ok: false, message: 'Write a number.' };
  let value = 0;
  let first = true;
  while (rest !== '') {
    const term = TERM.exec(rest);
    if (!term || (!first && term[1] === '')) return { ok: false, message: unread(kind) };
    const [whole, sign, digits, written] = term;
    const factor = written || kind !== 'length' ? factorOf(written, kind) : MM_PER_UNIT[unit];
    if (factor === null) return { ok: false, message: unread(kind) };
    value += (sign === '-' ? -1 : 1) * Number(digits) * factor;
    rest = rest.slice(whole.length);
    first = false;
  }
  return { ok: true, value: Math.round(value * 1e6) / 1e6 };
}

function factorOf(unit: string | undefined, kind: 'length' | 'angle' | 'number'): number | null {
  if (!unit) return 1;
  if (kind === 'angle') return unit === '°' || unit === 'deg' ? 1 : null;
  return kind === 'length' ? (MM_PER[unit] ?? null) : null;
}

function unread(kind: 'length' | 'angle' | 'number'): string {
  if (kind === 'length') return 'That is no length. Write one such as 2500, 2.5 m or 1200 + 350.';
  if (kind === 'angle') return 'That is no angle. Write degrees, such as −17 or 90.';
  return 'That is no number. Write digits, with a point for the fraction.';
}

/** A number as the sheet prints it: no trailing zeros, a true minus sign. */
export function printed(value: number, fractionDigits = 2): string {
  const rounded = Number(value.toFixed(fractionDigits)) + 0;
  return String(rounded).replace('-', '\u2212');
}

/** A number with exactly so many digits after the point, for columns that line up. */
export function printedFixed(value: number, fractionDigits: number): string {
  return (Number(value.toFixed(fractionDigits)) + 0).toFixed(fractionDigits).replace('-', '\u2212');
}

/** Where an item stands, as the list says it: `x 3720 y 3920 −17°`. */
export function placeWords(
  item: { readonly xMm: number; readonly yMm: number; readonly angleDeg: number },
  unit: LengthUnit = 'mm',
): string {
  const [x, y] = [item.xMm, item.yMm].map((mm) => lengthFigure(mm, unit, 0));
  return `x ${x} y ${y} ${printed(item.angleDeg, 1)}°`;
}
