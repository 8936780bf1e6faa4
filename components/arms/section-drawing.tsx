'use client';

import type { SectionGrid } from '@/lib/layout/arm-section';
import { SectionMap } from './section-map';
import type { ArmStudy } from './use-arm-study';

/** Drawing units across; the lettering counts in them. */
const WIDTH = 430;
const FOOT = 22;
/** Distances between upright lines to choose from, mm: about four come to stand in the drawing. */
const MARKS_MM = [50, 100, 200, 250, 500, 1000, 2000, 5000, 10_000, 20_000];

interface SectionDrawingProps {
  study: ArmStudy;
  /** Whether there is a chain that can be drawn. */
  isAwaited: boolean;
  /** Read aloud as what is drawn. */
  name: string;
}

/** The arm cut along its first axis, to scale: the map of the cut, upright lines, and the arm with its tool down. */
export function SectionDrawing({ study: { facts, map }, isAwaited, name }: SectionDrawingProps) {
  if (!facts)
    return (
      <p className="flex aspect-square items-center justify-center text-center text-ink-soft">
        {isAwaited ? 'Drawing the arm' : 'The arm is drawn as soon as its table is complete.'}
      </p>
    );
  const { grid, posture, reachMm } = facts;
  const { left, bottom, widthMm, heightMm } = frameOf(grid);
  const unit = WIDTH / widthMm;
  const height = heightMm * unit;
  const x = (xMm: number): number => (xMm - left) * unit;
  const y = (zMm: number): number => height - (zMm - bottom) * unit;
  const path = posture.body
    .map(([xMm, zMm], at) => `${at ? 'L' : 'M'}${x(xMm).toFixed(1)} ${y(zMm).toFixed(1)}`)
    .join('');
  const [toolXMm, toolZMm] = posture.body[posture.body.length - 1];
  const stepMm = MARKS_MM.find((mm) => mm * 4 >= reachMm) ?? 50_000;
  const marks = Array.from({ length: Math.floor((left + widthMm) / stepMm) + 1 }, (_, index) => index * stepMm);
  return (
    <div className="relative overflow-hidden">
      {map && <SectionMap map={map} style={placeOf(map.fineGrid, grid, height)} />}
      <svg
        viewBox={`0 0 ${WIDTH} ${height + FOOT}`}
        role="img"
        aria-label={`${name || 'The arm'} from the side with its tool down. The darker the spot, the more evenly it moves there.`}
        className="relative block w-full"
      >
        <g stroke="var(--ink)" strokeOpacity="0.1">
          {marks.map((mm) => (
            <path key={mm} d={`M${x(mm)} 0V${height}`} />
          ))}
        </g>
        <g className="font-mono text-[11px]" fill="var(--ink-soft)" textAnchor="middle">
          {marks
            .filter((mm) => x(mm) < WIDTH - 16)
            .map((mm) => (
              <text key={mm} x={x(mm)} y={height + 16}>
                {mm}
              </text>
            ))}
        </g>
        <path d={`M0 ${y(0)}H${WIDTH}`} stroke="var(--ink)" strokeWidth="1.3" />
        <g fill="none" strokeLinecap="round" strokeLinejoin="round">
          <path d={path} stroke="var(--ink)" strokeWidth="12" />
          <path d={path} stroke="var(--sheet)" strokeWidth="9" />
        </g>
        {posture.joints.map(({ number, at: [xMm, zMm] }, index) => (
          <g key={number}>
            <circle cx={x(xMm)} cy={y(zMm)} r="6" fill="var(--sheet)" stroke="var(--ink)" strokeWidth="1.6" />
            <text
              {...besideJoint(index, posture.joints.length, x(xMm), y(zMm))}
              className="text-[12px] font-semibold"
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

/** Beside the arm, not on it: the upper arm rises to the right of the first joint, the forearm falls to the right of the next. */
function besideJoint(index: number, count: number, x: number, y: number) {
  if (index === count - 1) return { x: x + 10, y: y - 9 };
  return index === 0 ? { x: x + 10, y: y + 13 } : { x: x - 9, y: y - 8, textAnchor: 'end' as const };
}

function frameOf({ originXMm, originZMm, stepMm, columns, rows }: SectionGrid) {
  return {
    left: originXMm - stepMm / 2,
    bottom: originZMm - stepMm / 2,
    widthMm: columns * stepMm,
    heightMm: rows * stepMm,
  };
}

/** Where a map lies in the drawing, in shares of it: one of the arm before may still be on show. */
function placeOf(map: SectionGrid, drawing: SectionGrid, height: number) {
  const [own, whole] = [frameOf(map), frameOf(drawing)];
  const percent = (share: number): string => `${(100 * share).toFixed(4)}%`;
  const withFoot = (height + FOOT) / height;
  const top = whole.bottom + whole.heightMm - own.bottom - own.heightMm;
  return {
    left: percent((own.left - whole.left) / whole.widthMm),
    width: percent(own.widthMm / whole.widthMm),
    top: percent(top / whole.heightMm / withFoot),
    height: percent(own.heightMm / whole.heightMm / withFoot),
  };
}
