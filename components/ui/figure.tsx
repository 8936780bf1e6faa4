'use client';

import { classNames } from './class-names';
import { formatFigure, NO_BREAK_SPACE, type FigureFormat } from './format-figure';
import { useMillimetres } from './millimetres-context';

interface FigureProps extends FigureFormat {
  value: number | null | undefined;
  unit?: string;
  className?: string;
}

/** A number with its unit, in the mono face. A length in mm is written in the reader's own unit. */
export function Figure({ value: given, unit: givenUnit, className, ...givenFormat }: FigureProps) {
  const chosen = useMillimetres();
  const length = givenUnit === 'mm' ? chosen : null;
  const unit = length?.unit ?? givenUnit;
  const value = length && typeof given === 'number' ? given / length.mmPerUnit : given;
  const format = { ...givenFormat, decimals: (givenFormat.decimals ?? 0) + (length?.moreDecimals ?? 0) };
  const text = formatFigure(value, format);
  const joint = unit === '°' || unit === '%' ? '' : NO_BREAK_SPACE;
  return (
    <span className={classNames('font-mono whitespace-nowrap tabular-nums', className)}>
      {text}
      {unit && text !== '–' ? `${joint}${unit}` : ''}
    </span>
  );
}
