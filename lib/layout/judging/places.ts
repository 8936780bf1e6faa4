import type { TaskPattern } from '../items';

export interface PatternPlace {
  /** From 1, in the order of the pattern's numbering. */
  readonly place: number;
  readonly row: number;
  readonly column: number;
  readonly layer: number;
  readonly xMm: number;
  readonly yMm: number;
  readonly zMm: number;
}

export const placeCount = ({ rows, columns, layers }: Pick<TaskPattern, 'rows' | 'columns' | 'layers'>): number =>
  rows * columns * layers;

/** One place of a pattern in its fixture's frame; `place` counts from 1. Row, column and layer count from 1 too. */
export function patternPlace(pattern: TaskPattern, place: number): PatternPlace {
  const { rows, columns, numbering } = pattern;
  const index = place - 1;
  const layer = Math.floor(index / (rows * columns));
  const inLayer = index % (rows * columns);
  const row = Math.floor(inLayer / columns);
  const along = inLayer % columns;
  const column = numbering === 'snake' && row % 2 === 1 ? columns - 1 - along : along;
  return {
    place,
    row: row + 1,
    column: column + 1,
    layer: layer + 1,
    xMm: pattern.xMm + column * pattern.pitchXMm,
    yMm: pattern.yMm + row * pattern.pitchYMm,
    zMm: pattern.zMm + layer * pattern.pitchZMm,
  };
}

export function patternPlaces(pattern: TaskPattern): PatternPlace[] {
  return Array.from({ length: placeCount(pattern) }, (_, index) => patternPlace(pattern, index + 1));
}
