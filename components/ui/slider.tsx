'use client';

import { Slider as Radix } from 'radix-ui';

interface SliderProps {
  label: string;
  /** 0 to 100. */
  value: number;
  onValueChange: (value: number) => void;
}

/** A share of a hundred: drag, click, or arrow keys in steps of five. */
export function Slider({ label, value, onValueChange }: SliderProps) {
  return (
    <Radix.Root
      value={[value]}
      min={0}
      max={100}
      step={5}
      onValueChange={([next = value]) => onValueChange(next)}
      className="relative flex h-7 w-full touch-none items-center select-none pointer-coarse:h-11"
    >
      <Radix.Track className="relative h-px flex-1 bg-ink-soft">
        <Radix.Range className="absolute h-[3px] -translate-y-px bg-petrol" />
      </Radix.Track>
      <Radix.Thumb
        aria-label={label}
        aria-valuetext={`${value} %`}
        className="block h-4 w-2.5 border border-petrol bg-sheet focus-visible:bg-petrol"
      />
    </Radix.Root>
  );
}
