'use client';

import { useMemo } from 'react';
import { nice } from 'd3';
import { floorDifference, type FloorDifference } from '@/lib/layout/floor-figures';
import { composeFloorMap, floorGridOf, type FloorMap } from '@/lib/layout/floor-map';
import { comparedFigures, guardedAreaM2, type ComparedFigure, type SheetFigures } from '@/lib/layout/compared-figures';
import { itemDifferences, matchItems, moveWords, type ItemDifference, type ItemPair } from '@/lib/layout/differences';
import type { MapMeasure, MapSettings } from '@/lib/layout/map-settings';
import { valueRange, type ValueRange } from '@/lib/layout/scales';
import { effectsOf, pointChanges, type Effect } from '@/lib/layout/verdict-differences';
import { floorFigures, verdictFigures } from '@/lib/layout/verdict-figures';
import type { Side } from './use-side';

export interface ChangedItem extends ItemDifference {
  readonly effects: readonly Effect[];
}

export interface Comparison {
  readonly left: Side;
  readonly right: Side;
  readonly leftMap: FloorMap | null;
  readonly rightMap: FloorMap | null;
  readonly difference: FloorDifference | null;
  readonly measure: MapMeasure;
  /** One for both sheets. */
  readonly range: ValueRange;
  /** The change at the ends of the diverging scale. */
  readonly limit: number;
  readonly threshold: number | null;
  readonly figures: readonly ComparedFigure[];
  readonly changed: readonly ChangedItem[];
  readonly moved: readonly ItemPair[];
  /** Further sheets for the table of numbers, each against the left one. */
  readonly others: readonly { readonly side: Side; readonly figures: readonly ComparedFigure[] }[];
}

/** Everything that two sheets say beside one another, at one question. */
export function useComparison(
  left: Side | null,
  right: Side | null,
  settings: MapSettings,
  third: Side | null,
  fourth: Side | null,
): Comparison | null {
  const maps = useMemo(() => left && right && composeBoth(left, right, settings), [left, right, settings]);
  return useMemo(() => {
    if (!left || !right || !maps) return null;
    const threshold = settings.measure === 'reach' ? null : settings.thresholds[settings.measure];
    const figuresOf = ({ reading, document }: Side, map: FloorMap | null) => ({
      verdicts: verdictFigures(reading.verdicts),
      floor: map && floorFigures(map, map.measure === 'reach' ? null : threshold),
      guardedM2: guardedAreaM2(document.items.filter(({ hidden }) => !hidden)),
    });
    const leftFigures = figuresOf(left, maps.leftMap);
    const against = (figures: SheetFigures) => comparedFigures(leftFigures, figures, settings.measure, threshold);
    const others = [third, fourth].filter((side) => side !== null);
    const matched = matchItems(left.document.items, right.document.items);
    const changes = pointChanges(matched, left.reading.verdicts, right.reading.verdicts);
    return {
      left,
      right,
      ...maps,
      measure: settings.measure,
      threshold,
      figures: against(figuresOf(right, maps.rightMap)),
      others: others.map((side) => ({ side, figures: against(figuresOf(side, composeOne(side, settings))) })),
      changed: itemDifferences(matched).map((difference) => ({
        ...difference,
        effects: effectsOf(difference, changes),
      })),
      moved: matched.pairs.filter((pair) => moveWords(pair.left, pair.right) !== null),
    };
  }, [left, right, maps, settings, third, fourth]);
}

function composeOne({ placed }: Side, { stepMm, measure }: MapSettings): FloorMap | null {
  const grid = floorGridOf(placed, stepMm);
  return grid && placed.length > 0 ? composeFloorMap(grid, placed, measure) : null;
}

function composeBoth(left: Side, right: Side, { stepMm, measure }: MapSettings) {
  const grid = floorGridOf([...left.placed, ...right.placed], stepMm);
  const isWhole = ({ placed, reading }: Side) => placed.length > 0 && placed.length === reading.robots.length;
  const compose = (side: Side) => (grid && side.placed.length > 0 ? composeFloorMap(grid, side.placed, measure) : null);
  const [leftMap, rightMap] = [compose(left), compose(right)];
  // A difference against half a map would show floor as lost that only has not been computed yet.
  const difference = leftMap && rightMap && isWhole(left) && isWhole(right) ? floorDifference(leftMap, rightMap) : null;
  const values = [leftMap, rightMap].flatMap((map) => (map ? [map.value] : []));
  return { leftMap, rightMap, difference, range: valueRange(measure, ...values), limit: limitOf(difference) };
}

function limitOf(difference: FloorDifference | null): number {
  let greatest = 0;
  for (const value of difference?.value ?? []) if (Math.abs(value) > greatest) greatest = Math.abs(value);
  return greatest > 0 ? nice(0, greatest, 5)[1] : 1;
}
