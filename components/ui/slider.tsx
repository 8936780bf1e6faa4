'use client';

import { Slider as Radix } from 'radix-ui';
import { classNames } from './class-names';

interface SliderProps {
  label: string;
  value: number;
  onValueChange: (value: number) => void;
  /** Once the value is put down. */
  onValueCommit?: (value: number) => void;
  /** Without these a share of a hundred in steps of five. */
  min?: number;
  max?: number;
  step?: number;
  /** How the value is said aloud. */
  valueText?: string;
  /** Marks on the track, in the slider's own unit. */
  marks?: readonly number[];
  className?: string;
}

/** One value along a line: drag, click, or arrow keys. */
export function Slider(props: SliderProps) {
  const { label, value, onValueChange, min = 0, max = 100, step = 5, marks = [], className } = props;
  return (
    <Radix.Root
      value={[value]}
      min={min}
      max={max}
      step={step}
      onValueChange={([next = value]) => onValueChange(next)}
      onValueCommit={([next = value]) => props.onValueCommit?.(next)}
      className={classNames(
        'relative flex h-7 w-full touch-none items-center select-none pointer-coarse:h-11',
        className,
      )}
    >
      <Radix.Track className="relative h-px flex-1 bg-ink-soft">
        <Radix.Range className="absolute h-[3px] -translate-y-px bg-petrol" />
        {marks.map((mark) => (
          <span
            key={mark}
            aria-hidden
            className="absolute -top-1 h-2 w-px bg-ink-soft"
            style={{ left: `${(100 * (mark - min)) / (max - min || 1)}%` }}
          />
        ))}
      </Radix.Track>
      <Radix.Thumb
        aria-label={label}
        aria-valuetext={props.valueText ?? `${value} %`}
        className="block h-4 w-2.5 border border-petrol bg-sheet focus-visible:bg-petrol"
      />
    </Radix.Root>
  );
}
