'use client';

import { useId } from 'react';
import { scaleBand, scaleLinear } from 'd3';
import { useSize } from '@/components/ui/use-size';
import type { CellCycle, ChartBar } from '@/lib/layout/cycle/cell-cycle';
import { seconds } from './seconds';

const ROW = 30;
const LEFT = 34;
const RIGHT = 12;
const FOOT = 20;

const KINDS: Record<ChartBar['kind'], string> = {
  joint: 'joint move',
  straight: 'straight move',
  path: 'along a path',
  hold: 'stands',
  queue: 'waits for a zone',
};

/** The robots against one another, as bars over time; told apart by fill and hatching as well as by words. */
export function TimeChart({ cell }: { readonly cell: CellCycle }) {
  const [sizeRef, size] = useSize();
  const hatchId = useId();
  const width = size?.width ?? 298;
  const { robots, stays, endS, problems } = cell;
  if (robots.length === 0) return null;
  const x = scaleLinear([0, endS || 1], [LEFT, Math.max(LEFT + 1, width - RIGHT)]);
  const y = scaleBand(
    robots.map(({ robotId }) => robotId),
    [0, ROW * robots.length],
  ).padding(0.3);
  const height = ROW * robots.length + FOOT;
  const ticks = x.ticks(5);
  const digits = Math.max(0, ...ticks.map((tick) => (String(tick).split('.')[1] ?? '').length));
  return (
    <section aria-labelledby="chart-title" className="border-b border-rule px-3.5 pt-2 pb-3">
      <h3 id="chart-title" className="text-[0.8125rem] font-medium text-ink-soft">
        Robots against one another, estimated
      </h3>
      <div ref={sizeRef}>
        <svg
          role="img"
          aria-label={`Time chart: ${robots.map(({ robotName, endS: end }) => `${robotName} ${seconds(end)} s`).join(', ')}. The table below says the same.`}
          width={width}
          height={height}
          className="block"
        >
          <defs>
            <pattern id={hatchId} width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
              <rect width="5" height="5" className="fill-sheet" />
              <line x1="0" y1="0" x2="0" y2="5" strokeWidth="2" className="stroke-red" />
            </pattern>
          </defs>
          {ticks.map((tick) => (
            <g key={tick} transform={`translate(${x(tick)},0)`}>
              <line y2={height - FOOT} className="stroke-hair" />
              <text y={height - 6} textAnchor="middle" className="fill-ink-soft font-mono text-[11px]">
                {tick.toFixed(digits)}
              </text>
            </g>
          ))}
          <text x={LEFT - 6} y={height - 6} textAnchor="end" className="fill-ink-soft text-[12px]">
            s
          </text>
          {robots.map(({ robotId, robotName, bars, targetS }) => {
            const top = y(robotId)!;
            const tall = y.bandwidth();
            return (
              <g key={robotId} data-chart-robot={robotName}>
                <text x={0} y={top + tall / 2 + 4} className="fill-ink text-[13px] font-medium">
                  {robotName.length > 5 ? `${robotName.slice(0, 4)}…` : robotName}
                </text>
                {bars.map((bar, index) => (
                  <Bar key={index} bar={bar} x={x} top={top} tall={tall} hatch={`url(#${hatchId})`} />
                ))}
                {stays
                  .filter((stay) => stay.robotId === robotId)
                  .map((stay, index) => (
                    <line
                      key={index}
                      x1={x(stay.fromS)}
                      x2={x(stay.toS)}
                      y1={top + tall + 2.5}
                      y2={top + tall + 2.5}
                      strokeWidth="2"
                      className="stroke-amber"
                    />
                  ))}
                {targetS !== null && targetS <= endS && (
                  <line
                    x1={x(targetS)}
                    x2={x(targetS)}
                    y1={top - 3}
                    y2={top + tall + 3}
                    strokeWidth="1.5"
                    className="stroke-red"
                  />
                )}
              </g>
            );
          })}
        </svg>
      </div>
      <p className="flex flex-wrap gap-x-3 text-[0.8125rem] text-ink-soft">
        <Key className="bg-ink">moves</Key>
        <Key className="bg-petrol">along a path</Key>
        <Key className="border border-ink-soft">stands</Key>
        {robots.some(({ queuedS }) => queuedS > 0) && <Key className="bg-red">waits for a zone</Key>}
        {stays.length > 0 && <Key className="h-0.5! bg-amber">in a shared zone</Key>}
      </p>
      {problems.map((problem) => (
        <p key={problem} role="status" className="mt-1 text-sm text-red">
          {problem}
        </p>
      ))}
      {robots.length > 1 && (
        <p className="mt-1 text-sm">All start together; the last is done after about {seconds(endS)} s.</p>
      )}
      <ChartTable cell={cell} />
    </section>
  );
}

function Key({ className, children }: { readonly className: string; readonly children: React.ReactNode }) {
  return (
    <span className="inline-flex items-center gap-1.5">
      <span aria-hidden className={`inline-block h-2.5 w-3.5 ${className}`} />
      {children}
    </span>
  );
}

interface BarProps {
  readonly bar: ChartBar;
  readonly x: (value: number) => number;
  readonly top: number;
  readonly tall: number;
  readonly hatch: string;
}

function Bar({ bar, x, top, tall, hatch }: BarProps) {
  const { kind, fromS, toS, label } = bar;
  const inset = kind === 'hold' ? 0.5 : 0;
  return (
    <rect
      x={x(fromS) + inset}
      y={top + inset}
      width={Math.max(0.75, x(toS) - x(fromS) - 2 * inset)}
      height={tall - 2 * inset}
      fill={kind === 'queue' ? hatch : undefined}
      className={
        kind === 'path'
          ? 'fill-petrol stroke-sheet'
          : kind === 'hold'
            ? 'fill-sheet stroke-ink-soft'
            : kind === 'queue'
              ? 'stroke-red'
              : 'fill-ink stroke-sheet'
      }
      strokeWidth={kind === 'path' || kind === 'joint' || kind === 'straight' ? 0.5 : 1}
    >
      <title>{`${label}: ${KINDS[kind]}, ${seconds(fromS)} to ${seconds(toS)} s`}</title>
    </rect>
  );
}

function ChartTable({ cell: { robots } }: { readonly cell: CellCycle }) {
  return (
    <details className="mt-2">
      <summary className="text-sm text-ink-soft hover:text-petrol">The chart as a table</summary>
      <table className="mt-1 w-full border-collapse text-sm">
        <caption className="sr-only">What each robot does when, in seconds, estimated</caption>
        <thead>
          <tr className="text-left text-[0.8125rem] text-ink-soft">
            <th scope="col" className="font-medium">
              Robot
            </th>
            <th scope="col" className="font-medium">
              Does
            </th>
            <th scope="col" className="text-right font-medium">
              From
            </th>
            <th scope="col" className="text-right font-medium">
              To, s
            </th>
          </tr>
        </thead>
        <tbody>
          {robots.flatMap(({ robotId, robotName, bars }) =>
            bars.map(({ label, kind, fromS, toS }, index) => (
              <tr key={`${robotId} ${index}`} className="border-t border-hair">
                <th scope="row" className="pr-2 text-left align-top font-normal">
                  {robotName}
                </th>
                <td>
                  {label} <span className="text-ink-soft">({KINDS[kind]})</span>
                </td>
                <td className="pl-2 text-right align-top font-mono text-[0.8125rem]">{seconds(fromS)}</td>
                <td className="pl-2 text-right align-top font-mono text-[0.8125rem]">{seconds(toS)}</td>
              </tr>
            )),
          )}
        </tbody>
      </table>
    </details>
  );
}
