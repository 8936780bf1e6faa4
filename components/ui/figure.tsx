import { classNames } from './class-names';

interface FigureFormat {
  decimals?: number;
  /** Write + before a gain. */
  signed?: boolean;
}

const NO_BREAK_SPACE = '\u00a0';
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

interface FigureProps extends FigureFormat {
  value: number | null | undefined;
  unit?: string;
  className?: string;
}

/** A number with its unit, in the mono face. */
export function Figure({ value, unit, className, ...format }: FigureProps) {
  const text = formatFigure(value, format);
  const joint = unit === '°' || unit === '%' ? '' : NO_BREAK_SPACE;
  return (
    <span className={classNames('font-mono whitespace-nowrap tabular-nums', className)}>
      {text}
      {unit && text !== '–' ? `${joint}${unit}` : ''}
    </span>
  );
}
