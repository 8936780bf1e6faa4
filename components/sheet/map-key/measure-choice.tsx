'use client';

import { ChevronDown } from 'lucide-react';
import { Menu, MenuChoice, MenuHeading, MenuRule } from '@/components/ui/menu';
import type { MapMeasure } from '@/lib/layout/map-settings';
import { MEASURE_WORDS } from '@/lib/layout/measure-words';
import { MAP_SCALE_NAMES, MAP_SCALES, type MapScale } from '@/lib/layout/scales';
import { ScaleBar } from './scale-bar';

interface MeasureChoiceProps {
  readonly measure: MapMeasure;
  readonly scale: MapScale;
  readonly onMeasureChange: (measure: MapMeasure) => void;
  readonly onScaleChange: (scale: MapScale) => void;
}

const MEASURES = (Object.keys(MEASURE_WORDS) as MapMeasure[]).map((value) => ({
  value,
  label: MEASURE_WORDS[value].name,
}));

const SCALES = MAP_SCALES.map((value) => ({
  value,
  label: (
    <span className="flex flex-1 items-center justify-between gap-4">
      {MAP_SCALE_NAMES[value]}
      <ScaleBar scale={value} className="h-3 w-20" />
    </span>
  ),
}));

/** The measure's name is the heading of the key and opens the choice of measure and colours. */
export function MeasureChoice({ measure, scale, onMeasureChange, onScaleChange }: MeasureChoiceProps) {
  return (
    <Menu
      align="start"
      trigger={
        <button
          type="button"
          className="-mx-1 flex max-w-full items-center gap-1 self-start rounded px-1 text-left font-semibold hover:bg-petrol-wash pointer-coarse:min-h-11"
        >
          <span className="truncate">{MEASURE_WORDS[measure].name}</span>
          <ChevronDown aria-hidden className="size-4 shrink-0" />
          <span className="sr-only">Choose measure and colours</span>
        </button>
      }
    >
      <MenuHeading>Measure</MenuHeading>
      <MenuChoice label="Measure" value={measure} onValueChange={onMeasureChange} options={MEASURES} />
      <MenuRule />
      <MenuHeading>Colours, light poor to dark good</MenuHeading>
      <MenuChoice label="Colours" value={scale} onValueChange={onScaleChange} options={SCALES} />
    </Menu>
  );
}
