'use client';

import { useMemo } from 'react';
import type { LibraryArm } from '@/lib/contracts/arms';
import { sectionGrid, sectionPosture } from '@/lib/layout/arm-section';
import { SectionMap } from './section-map';

/** Drawing units a cell of the map; the lettering counts in them too. */
const CELL = 4;
const FOOT = 24;
const GRID_MM = 500;

/** The arm cut along its first axis, to scale: the map of the cut, half-metre lines, and the arm with its tool down. */
export function SectionDrawing({ arm }: { arm: LibraryArm }) {
  const { definition, reachMm } = arm;
  const grid = useMemo(() => sectionGrid(reachMm), [reachMm]);
  const posture = useMemo(() => sectionPosture(definition, reachMm), [definition, reachMm]);
  const width = grid.columns * CELL;
  const height = grid.rows * CELL;
  const x = (xMm: number): number => ((xMm - grid.originXMm) / grid.stepMm + 0.5) * CELL;
  const y = (zMm: number): number => height - ((zMm - grid.originZMm) / grid.stepMm + 0.5) * CELL;
  const path = posture.body
    .map(([xMm, zMm], at) => `${at ? 'L' : 'M'}${x(xMm).toFixed(1)} ${y(zMm).toFixed(1)}`)
    .join('');
  const [toolXMm, toolZMm] = posture.body[posture.body.length - 1];
  const marks = Array.from({ length: Math.floor((1.05 * reachMm) / GRID_MM) + 1 }, (_, index) => index * GRID_MM);
  return (
    <div className="relative">
      <SectionMap arm={definition} grid={grid} className="absolute inset-x-0 top-0 w-full" />
      <svg
        viewBox={`0 0 ${width} ${height + FOOT}`}
        role="img"
        aria-label={`${arm.name} from the side with its tool down. The darker the spot, the more evenly it moves there.`}
        className="relative block w-full"
      >
        <g stroke="var(--ink)" strokeOpacity="0.13">
          {marks.map((mm) => (
            <path key={mm} d={`M${x(mm)} 0V${height}`} />
          ))}
        </g>
        <g className="font-mono text-[12px]" fill="var(--ink-soft)" textAnchor="middle">
          {marks.map((mm) => (
            <text key={mm} x={x(mm)} y={height + 16}>
              {mm}
            </text>
          ))}
        </g>
        <path d={`M0 ${y(0)}H${width}`} stroke="var(--ink)" strokeWidth="1.3" />
        <g fill="none" strokeLinecap="round" strokeLinejoin="round">
          <path d={path} stroke="var(--ink)" strokeWidth="13" />
          <path d={path} stroke="var(--sheet)" strokeWidth="9.8" />
        </g>
        {posture.joints.map(({ number, at: [xMm, zMm] }, index) => (
          <g key={number}>
            <circle cx={x(xMm)} cy={y(zMm)} r="6.5" fill="var(--sheet)" stroke="var(--ink)" strokeWidth="1.7" />
            <text
              x={x(xMm) + (index === posture.joints.length - 1 ? 11 : -10)}
              y={y(zMm) - 8}
              // Beside the arm, not on it: the forearm comes down on the right of the others.
              textAnchor={index === posture.joints.length - 1 ? 'start' : 'end'}
              className="text-[13px] font-semibold"
              fill="var(--ink)"
              stroke="var(--sheet)"
              strokeWidth="3.5"
              paintOrder="stroke"
            >
              J{number}
            </text>
          </g>
        ))}
        <circle cx={x(toolXMm)} cy={y(toolZMm)} r="4.5" fill="var(--red)" />
      </svg>
    </div>
  );
}
