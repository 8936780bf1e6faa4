'use client';

import { useUnits } from '@/lib/client/use-units';
import { MM_PER_UNIT } from '@/lib/layout/length-units';
import { classNames } from './class-names';
import { formatFigure, NO_BREAK_SPACE, type FigureFormat } from './format-figure';

interface FigureProps extends FigureFormat {
  value: number | null | undefined;
  unit?: string;
  className?: string;
}

/** A number with its unit, in the mono face. A length in mm is written in the reader's own unit. */
export function Figure({ value: given, unit: givenUnit, className, ...givenFormat }: FigureProps) {
  const { unit: lengthUnit } = useUnits();
  const isInch = givenUnit === 'mm' && lengthUnit === 'in';
  const unit = isInch ? 'in' : givenUnit;
  const value = isInch && typeof given === 'number' ? given / MM_PER_UNIT.in : given;
  const format = isInch ? { ...givenFormat, decimals: (givenFormat.decimals ?? 0) + 2 } : givenFormat;
  const text = formatFigure(value, format);
  const joint = unit === '°' || unit === '%' ? '' : NO_BREAK_SPACE;
  return (
    <span className={classNames('font-mono whitespace-nowrap tabular-nums', className)}>
      {text}
      {unit && text !== '–' ? `${joint}${unit}` : ''}
    </span>
  );
}
