'use client';

import { useMemo } from 'react';
import type { LibraryArm } from '@/lib/contracts/arms';
import { sectionPosture, type SectionPoint } from '@/lib/layout/arm-section';

const WIDTH = 430;
const HEIGHT = 400;
const MARGIN = 26;
/** Room behind the first axis, as a share of the reach. */
const BEHIND = 0.42;
const ABOVE = 1.3;
const BELOW = 0.55;
const GRID_MM = 500;

/** The arm cut along its first axis, to scale, on a half-metre grid. */
export function SectionDrawing({ arm }: { arm: LibraryArm }) {
  const posture = useMemo(() => sectionPosture(arm.definition, arm.reachMm), [arm]);
  const scale = Math.min(
    (WIDTH - 2 * MARGIN) / (arm.reachMm * (1.15 + BEHIND)),
    (HEIGHT - 2 * MARGIN) / (arm.reachMm * (ABOVE + BELOW)),
  );
  const x = (mm: number): number => MARGIN + (mm + arm.reachMm * BEHIND) * scale;
  const y = (mm: number): number => MARGIN + (arm.reachMm * ABOVE - mm) * scale;
  const path = posture.body
    .map(([xMm, zMm], index) => `${index === 0 ? 'M' : 'L'}${x(xMm).toFixed(1)} ${y(zMm).toFixed(1)}`)
    .join('');
  const tool: SectionPoint = posture.body[posture.body.length - 1];
  const grid = Array.from({ length: Math.floor((arm.reachMm * 1.15) / GRID_MM) + 1 }, (_, index) => index * GRID_MM);
  return (
    <svg
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      role="img"
      aria-label={`${arm.name} from the side, tool down`}
      className="block w-full"
    >
      <g stroke="var(--hair)">
        {grid.map((mm) => (
          <path key={mm} d={`M${x(mm)} ${MARGIN / 2}V${HEIGHT - MARGIN}`} />
        ))}
      </g>
      <g className="font-mono text-[11px]" fill="var(--ink-soft)" textAnchor="middle">
        {grid.map((mm) => (
          <text key={mm} x={x(mm)} y={HEIGHT - 8}>
            {mm}
          </text>
        ))}
      </g>
      <path d={`M0 ${y(0)}H${WIDTH}`} stroke="var(--ink-soft)" strokeWidth="1.5" />
      <g fill="none" strokeLinecap="round" strokeLinejoin="round">
        <path d={path} stroke="var(--ink)" strokeWidth="13" />
        <path d={path} stroke="var(--sheet)" strokeWidth="9.6" />
      </g>
      {posture.joints.map(({ number, at }) => (
        <g key={number}>
          <circle cx={x(at[0])} cy={y(at[1])} r="6.5" fill="var(--sheet)" stroke="var(--ink)" strokeWidth="1.7" />
          <text
            x={x(at[0]) + 11}
            y={y(at[1]) - 9}
            className="text-[12px] font-semibold"
            fill="var(--ink)"
            stroke="var(--sheet)"
            strokeWidth="3"
            paintOrder="stroke"
          >
            J{number}
          </text>
        </g>
      ))}
      <circle cx={x(tool[0])} cy={y(tool[1])} r="4.5" fill="var(--red)" />
    </svg>
  );
}
