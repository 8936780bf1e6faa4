'use client';

import { useId, useMemo, useRef, type KeyboardEvent, type PointerEvent } from 'react';
import { max, scaleLinear, ticks } from 'd3';
import { useSize } from '@/components/ui/use-size';
import { floorHistogramM2 } from '@/lib/layout/floor-figures';
import type { FloorMap } from '@/lib/layout/floor-map';
import { measureText, MEASURE_WORDS } from '@/lib/layout/measure-words';
import { REACH_SHARES, scaleColour, shareOf, type MapScale, type ValueRange } from '@/lib/layout/scales';

export interface FloorHistogramProps {
  readonly map: FloorMap;
  readonly scale: MapScale;
  readonly range: ValueRange;
  readonly threshold: number | null;
  /** The square metres at or above the line, for a screen reader. */
  readonly areaText: string;
  readonly onThresholdChange: (threshold: number | null, settled: boolean) => void;
}

const BARS = 56;
const HEIGHT = 84;
const BASE = 52;
const TOP = 4;
/** Arrow keys move the line by a hundredth of the scale, page keys by a tenth. */
const KEY_STEPS = 100;

/** Floor area by value with the reader's line in it. The line is a slider: pointer, touch and keys move it alike. */
export function FloorHistogram(props: FloorHistogramProps) {
  const { map, scale, range, threshold, areaText, onThresholdChange } = props;
  const [sizeRef, size] = useSize();
  const width = size?.width ?? 320;
  const hatchId = useId();
  const held = useRef(false);

  const x = useMemo(() => scaleLinear([range.from, range.to], [0, width]), [range, width]);
  const bars = useMemo(() => {
    const edges = Array.from({ length: BARS + 1 }, (_, index) => range.from + ((range.to - range.from) * index) / BARS);
    const areas = floorHistogramM2(map, edges);
    const height = scaleLinear([0, max(areas) || 1], [0, BASE - TOP]);
    return areas.map((area, index) => ({
      from: edges[index],
      to: edges[index + 1],
      // A bar of a few cells beside one of many would vanish; what is there is at least a pixel high.
      height: area > 0 ? Math.max(1, height(area)) : 0,
    }));
  }, [map, range]);

  const set = (value: number, settled: boolean) =>
    onThresholdChange(Number(Math.min(range.to, Math.max(range.from, value)).toPrecision(4)), settled);
  const valueAt = (event: PointerEvent<HTMLDivElement>) =>
    x.invert(event.clientX - event.currentTarget.getBoundingClientRect().left);

  const onKeyDown = (event: KeyboardEvent) => {
    const step = (range.to - range.from) / KEY_STEPS;
    const now = threshold ?? range.from;
    const moves: Record<string, number> = {
      ArrowRight: now + step,
      ArrowUp: now + step,
      ArrowLeft: now - step,
      ArrowDown: now - step,
      PageUp: now + 10 * step,
      PageDown: now - 10 * step,
      Home: range.from,
      End: range.to,
    };
    if (!(event.key in moves)) return;
    event.preventDefault();
    set(moves[event.key], true);
  };

  const at = threshold === null ? null : x(Math.min(range.to, Math.max(range.from, threshold)));
  const { measure } = map;
  if (measure === 'reach') return <ReachSwatches scale={scale} />;
  return (
    <div
      ref={sizeRef}
      role="slider"
      tabIndex={0}
      aria-label={`Threshold, ${MEASURE_WORDS[measure].name.toLowerCase()}`}
      aria-valuemin={range.from}
      aria-valuemax={range.to}
      aria-valuenow={threshold ?? range.from}
      aria-valuetext={threshold === null ? 'No line is set' : `${measureText(measure, threshold)}, ${areaText}`}
      className="relative cursor-ew-resize touch-none select-none"
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        held.current = true;
        set(valueAt(event), false);
      }}
      onPointerMove={(event) => held.current && set(valueAt(event), false)}
      onPointerUp={(event) => {
        if (held.current) set(valueAt(event), true);
        held.current = false;
      }}
      onPointerCancel={() => {
        if (held.current && threshold !== null) set(threshold, true);
        held.current = false;
      }}
    >
      <svg width={width} height={HEIGHT} aria-hidden className="block overflow-visible">
        <defs>
          <pattern id={hatchId} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
            <rect width="2" height="5" fill="var(--sheet)" />
          </pattern>
        </defs>
        {bars.map((bar) => {
          const left = x(bar.from);
          const box = { x: left, y: BASE - bar.height, width: Math.max(1, x(bar.to) - left - 0.5), height: bar.height };
          return (
            <g key={bar.from}>
              <rect {...box} fill={scaleColour(scale, shareOf(range, (bar.from + bar.to) / 2))} />
              {threshold !== null && bar.to <= threshold && <rect {...box} fill={`url(#${hatchId})`} />}
            </g>
          );
        })}
        <line x1={0} x2={width} y1={BASE + 0.5} y2={BASE + 0.5} stroke="var(--ink)" />
        <Ticks range={range} x={x} line={at} />
        {at !== null && threshold !== null && (
          <>
            <line x1={at} x2={at} y1={0} y2={BASE + 4} stroke="var(--red)" strokeWidth={1.6} />
            <path d={`M${at},${BASE + 1}l6,8h-12z`} fill="var(--red)" />
            <text
              x={Math.min(width - 16, Math.max(16, at))}
              y={HEIGHT - 8}
              textAnchor="middle"
              className="fill-red font-mono text-[12px] font-medium"
            >
              {threshold.toFixed(MEASURE_WORDS[measure].decimals)}
            </text>
          </>
        )}
      </svg>
    </div>
  );
}

interface TicksProps {
  readonly range: ValueRange;
  readonly x: (value: number) => number;
  readonly line: number | null;
}

/** Room that a figure needs to either side, px: a tick gives way to the line's own figure. */
const FIGURE_ROOM_PX = 30;

function Ticks({ range, x, line }: TicksProps) {
  const values = ticks(range.from, range.to, 4);
  const last = values[values.length - 1];
  return values
    .filter((value) => line === null || Math.abs(x(value) - line) > FIGURE_ROOM_PX)
    .map((value) => (
      <g key={value} transform={`translate(${x(value)},${BASE})`}>
        <line y2={4} stroke="var(--ink)" />
        <text
          y={HEIGHT - BASE - 8}
          textAnchor={value === range.from ? 'start' : value === last && value === range.to ? 'end' : 'middle'}
          className="fill-ink font-mono text-[12px]"
        >
          {Number(value.toPrecision(3))}
        </text>
      </g>
    ));
}

function ReachSwatches({ scale }: { readonly scale: MapScale }) {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1.5 text-sm">
      {(
        [
          [REACH_SHARES.one, 'one robot reaches it'],
          [REACH_SHARES.more, 'two or more do'],
        ] as const
      ).map(([share, words]) => (
        <li key={words} className="flex items-center gap-2">
          <svg className="h-4 w-7" aria-hidden>
            <rect width="28" height="16" fill={scaleColour(scale, share)} />
          </svg>
          {words}
        </li>
      ))}
    </ul>
  );
}
