import { polygonAreaMm2 } from './geometry';
import type { Item } from './items';
import type { MapMeasure } from './map-settings';
import { MEASURE_WORDS } from './measure-words';
import type { FloorFigures, VerdictFigures } from './verdict-figures';

/** One line of the table of numbers. Null where a sheet has no such number. */
export interface ComparedFigure {
  readonly label: string;
  readonly unit: string;
  readonly decimals: number;
  readonly left: number | null;
  readonly right: number | null;
  /** Written after the number, such as the 9 of `8 of 9`. */
  readonly leftOf?: number;
  readonly rightOf?: number;
  readonly better: 'more' | 'less' | 'neither';
}

export interface SheetFigures {
  readonly verdicts: VerdictFigures;
  /** Null until the sheet's maps are there. */
  readonly floor: FloorFigures | null;
  readonly guardedM2: number;
}

/** Floor inside closed guard lines, m². */
export function guardedAreaM2(items: readonly Item[]): number {
  return items.reduce(
    (sum, item) => (item.kind === 'guardLine' && item.closed ? sum + polygonAreaMm2(item.pointsMm) / 1e6 : sum),
    0,
  );
}

/** The numbers of two sheets side by side, the work first, then the floor. */
export function comparedFigures(
  left: SheetFigures,
  right: SheetFigures,
  measure: MapMeasure,
  threshold: number | null,
): ComparedFigure[] {
  const metres = (mm: number | null) => (mm === null ? null : mm / 1000);
  const floor = (label: string, pick: (figures: FloorFigures) => number | null, better: ComparedFigure['better']) => ({
    label,
    unit: 'm²',
    decimals: 1,
    left: left.floor && pick(left.floor),
    right: right.floor && pick(right.floor),
    better,
  });
  return [
    {
      label: 'Task points met',
      unit: '',
      decimals: 0,
      left: left.verdicts.met,
      right: right.verdicts.met,
      leftOf: left.verdicts.points,
      rightOf: right.verdicts.points,
      better: 'more',
    },
    {
      label: 'Worst task point, inverse condition number',
      unit: '',
      decimals: 2,
      left: left.verdicts.worstInverseConditionNumber,
      right: right.verdicts.worstInverseConditionNumber,
      better: 'more',
    },
    {
      label: 'Slowest wanted move, margin',
      unit: 'm/s',
      decimals: 2,
      left: metres(left.verdicts.slowestMarginMmS),
      right: metres(right.verdicts.slowestMarginMmS),
      better: 'more',
    },
    ...(threshold === null || measure === 'reach'
      ? []
      : [
          floor(
            `Floor at or above ${threshold.toFixed(MEASURE_WORDS[measure].decimals)}`,
            ({ atOrAboveM2 }) => atOrAboveM2,
            'more',
          ),
        ]),
    floor('Floor reached', ({ reachedM2 }) => reachedM2, 'more'),
    floor('Floor that two robots share', ({ sharedM2 }) => sharedM2, 'neither'),
    {
      label: 'Guarded floor',
      unit: 'm²',
      decimals: 1,
      left: left.guardedM2,
      right: right.guardedM2,
      better: 'neither',
    },
  ];
}

/** Right less left as both are written, so that the table adds up; null where one has no such number. */
export function changeOf({ left, right, decimals }: ComparedFigure): number | null {
  if (left === null || right === null) return null;
  return Number((Number(right.toFixed(decimals)) - Number(left.toFixed(decimals))).toFixed(decimals));
}

/** Whether right is better than left, as far as it is written: what rounds to no change is none. */
export function verdictOf(figure: ComparedFigure): 'better' | 'worse' | 'none' {
  const change = changeOf(figure);
  if (change === null || change === 0 || figure.better === 'neither') return 'none';
  return change > 0 === (figure.better === 'more') ? 'better' : 'worse';
}
