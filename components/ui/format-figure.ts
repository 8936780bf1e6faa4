export interface FigureFormat {
  decimals?: number;
  /** Write + before a gain. */
  signed?: boolean;
}

export const NO_BREAK_SPACE = '\u00a0';
const MINUS = '\u2212';

/** A number as the sheet writes it: a real minus, fixed decimals, thousands apart from 10 000 on, a dash for nothing. */
export function formatFigure(
  value: number | null | undefined,
  { decimals = 0, signed = false }: FigureFormat = {},
): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return '–';
  const digits = Math.abs(value).toFixed(decimals);
  const [whole = '', fraction] = digits.split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, NO_BREAK_SPACE) : whole;
  const isZero = Number(digits) === 0;
  const sign = isZero ? '' : value < 0 ? MINUS : signed ? '+' : '';
  return `${sign}${grouped}${fraction ? `.${fraction}` : ''}`;
}
