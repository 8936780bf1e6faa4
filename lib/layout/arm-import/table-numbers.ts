import { inUnit, storedFrom, type Unit } from '../arm-columns';

/** Numbers as people write them in tables: a point or a comma for the decimals, a real or a typed minus. */

export interface NumberCell {
  readonly text: string;
  readonly where: string;
}

const PLAIN = /^[+-]?(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d+)?$/i;
const LIKE_THOUSANDS = /^[+-]?\d{1,3},\d{3}$/;

export const tidyNumber = (text: string): string =>
  text.replace(/[\s\u00a0\u202f]/g, '').replace(/[\u2212\u2013]/g, '-');

/**
 * Which mark parts the decimals in a file, told from all of its numbers together. A comma is taken where it can mean nothing
 * else; the first cell that leaves it open is named with what to do.
 */
export function decimalMark(
  cells: readonly NumberCell[],
): { readonly mark: '.' | ',' } | { readonly doubt: NumberCell; readonly message: string } {
  const tidy = cells.map((cell) => ({ cell, text: tidyNumber(cell.text) }));
  const withPoint = tidy.filter(({ text }) => text.includes('.'));
  const withComma = tidy.filter(({ text }) => text.includes(','));
  if (withComma.length === 0) return { mark: '.' };
  if (withPoint.length > 0)
    return {
      doubt: withComma[0].cell,
      message: `“${withComma[0].cell.text.trim()}” has a comma and “${withPoint[0].cell.text.trim()}” a point. Write all numbers one way, without marks between thousands.`,
    };
  const alike = withComma.every(({ text }) => LIKE_THOUSANDS.test(text));
  if (alike)
    return {
      doubt: withComma[0].cell,
      message: `“${withComma[0].cell.text.trim()}” may mean thousands or decimals. Write it with a point or without the comma.`,
    };
  return { mark: ',' };
}

/** NaN for an empty text, null for one that is no number. */
export function readNumber(text: string, mark: '.' | ','): number | null {
  const tidy = tidyNumber(text);
  if (tidy === '') return NaN;
  if (!PLAIN.test(tidy) || (mark === '.' && tidy.includes(','))) return null;
  const value = Number(tidy.replace(',', '.'));
  return Number.isFinite(value) ? value : null;
}

/** The shortest decimals in a unit that come back as the very same stored number (m, rad). */
export function shortestText(stored: number, unit: Unit): string {
  if (!Number.isFinite(stored)) return '';
  const shown = inUnit(stored, unit);
  for (let digits = 6; digits < 17; digits++) {
    const text = String(Number(shown.toPrecision(digits)));
    if (storedFrom(Number(text), unit) === stored) return text;
  }
  return String(shown);
}
