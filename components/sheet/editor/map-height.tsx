'use client';

import { X } from 'lucide-react';
import { Button } from '@/components/ui/button';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { Slider } from '@/components/ui/slider';
import { ValueField } from '@/components/sheet/panels/value-field';
import { useUnits } from '@/lib/client/use-units';
import type { Robot } from '@/lib/layout/items';
import { heightsOf } from '@/lib/layout/map-stack';
import { useBoard, useBoardSettings } from './board-context';
import { useFloor } from './floor-context';
import { useSettingChange } from './use-setting-change';

/** The slider goes from the floor to where the highest arm ends, and a little beyond what is set. */
const LEAST_TOP_MM = 1500;
const HEIGHT_STEP_MM = 10;
const STACK_LIMIT = 12;

function topOf(robots: readonly Robot[], reachOf: (armId: string) => number, toolHeightMm: number): number {
  const tops = robots.map(({ armId, riserMm }) => riserMm + reachOf(armId));
  return Math.ceil(Math.max(LEAST_TOP_MM, toolHeightMm, ...tops) / 100) * 100;
}

/** The tool's height: typed, or along a line with the map following. */
export function MapHeight() {
  const { arms } = useBoard();
  const { robots } = useFloor();
  const { toolHeightMm } = useBoardSettings();
  const { length } = useUnits();
  const change = useSettingChange();
  const top = topOf(robots, (armId) => arms.get(armId)?.reachMm ?? 0, toolHeightMm);
  return (
    <>
      <ValueField
        label="Tool height over floor"
        kind="length"
        step={50}
        value={toolHeightMm}
        onCommit={(mm) => change({ toolHeightMm: mm }, 'Write −5000 to 20000 mm.')}
      />
      <Slider
        className="col-span-2"
        label="Tool height over floor, dragged"
        min={Math.min(0, toolHeightMm)}
        max={top}
        step={HEIGHT_STEP_MM}
        value={toolHeightMm}
        valueText={length(toolHeightMm)}
        onValueChange={(mm) => change({ toolHeightMm: mm }, '')}
      />
    </>
  );
}

/** The heights that are mapped beside the one shown. */
export function StackFields() {
  const settings = useBoardSettings();
  const { length } = useUnits();
  const change = useSettingChange();
  const { stackMm, stackShown, toolHeightMm } = settings;
  const without = (height: number) => {
    const left = stackMm.filter((other) => other !== height);
    change({ stackMm: left, ...(left.length === 0 && { stackShown: 'height' }) }, '');
  };
  const isIn = stackMm.includes(toolHeightMm);
  return (
    <fieldset className="col-span-2 min-w-0 border-t border-hair pt-2">
      <legend className="float-left mb-1 w-full text-[0.8125rem] text-ink-soft">
        Stack of heights{stackMm.length > 0 ? ', one map each' : ''}
      </legend>
      <ul className="clear-both flex flex-wrap gap-1.5">
        {heightsOf({ stackMm, toolHeightMm: stackMm[0] ?? NaN })
          .filter(Number.isFinite)
          .map((height) => (
            <li key={height} className="flex items-center border border-rule pl-1.5 font-mono text-sm">
              {length(height)}
              <Button
                variant="quiet"
                size="icon"
                className="size-6"
                aria-label={`Take ${length(height)} out of the stack`}
                onClick={() => without(height)}
              >
                <X aria-hidden className="size-3" />
              </Button>
            </li>
          ))}
        <li>
          <Button
            size="small"
            disabled={isIn || stackMm.length >= STACK_LIMIT}
            onClick={() => change({ stackMm: [...stackMm, toolHeightMm] }, '')}
          >
            {isIn ? `${length(toolHeightMm)} is in` : `Add ${length(toolHeightMm)}`}
          </Button>
        </li>
      </ul>
      {stackMm.length > 1 && (
        <SegmentedControl
          className="mt-2"
          label="What of the stack is shown"
          value={stackShown}
          onValueChange={(shown) => change({ stackShown: shown }, '')}
          options={[
            { value: 'height', label: 'One height' },
            { value: 'worst', label: 'Worst of all' },
          ]}
        />
      )}
    </fieldset>
  );
}

/** Steps through the heights of a stack, beside the words that state the question. */
export function StackSlider() {
  const settings = useBoardSettings();
  const { length } = useUnits();
  const change = useSettingChange();
  const heights = heightsOf(settings);
  if (settings.stackMm.length < 2 || settings.stackShown === 'worst') return null;
  const place = heights.indexOf(settings.toolHeightMm);
  return (
    <Slider
      label="Height shown of the stack"
      min={0}
      max={heights.length - 1}
      step={1}
      value={place}
      marks={heights.map((_, index) => index)}
      valueText={length(settings.toolHeightMm)}
      onValueChange={(index) => change({ toolHeightMm: heights[index] }, '')}
    />
  );
}
