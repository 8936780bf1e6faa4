'use client';

import { useEffect, useMemo, useRef } from 'react';
import type { LibraryArm } from '@/lib/contracts/arms';
import type { PlumbPosture, PlumbReading } from '@/lib/editor/plumb';
import type { SectionMap } from '@/lib/editor/section-map';
import { printed } from '@/lib/editor/measure-text';
import type { MapSettings } from '@/lib/layout/map-settings';
import { scaleTable, valueRange } from '@/lib/layout/scales';
import {
  SIDE_HEIGHT_PX,
  SIDE_WIDTH_PX,
  sideOfPosture,
  sideOfSpot,
  sideToPx,
  sideView,
  type SidePoint,
} from './side-view';
import { useSectionMap } from './use-section-map';

interface SideElevationProps {
  readonly reading: PlumbReading;
  readonly posture: PlumbPosture | null;
  readonly arm: LibraryArm | undefined;
  readonly settings: MapSettings;
}

/** The arm at the spot seen from the side, the height of the tool, and the map of the cut behind it. */
export function SideElevation({ reading, posture, arm, settings }: SideElevationProps) {
  const reachMm = arm?.reachMm ?? 1000;
  const { riserMm } = reading.robot;
  const view = useMemo(() => sideView(reachMm, riserMm), [reachMm, riserMm]);
  const section = useSectionMap(reading, arm, settings, view);
  const px = (point: SidePoint) => sideToPx(view, point);
  const path = (points: readonly SidePoint[]) => points.map((point) => px(point).join(' ')).join('L');

  const spot = sideOfSpot(reading);
  const body = posture ? distinct(sideOfPosture(reading, posture)) : [];
  const [, floorY] = px([0, 0]);
  const [, toolY] = px(spot);
  const [spotX] = px(spot);
  const plate = reachMm * 0.095;
  const [plateLeft, plateTop] = px([-plate, riserMm]);
  const [plateRight] = px([plate, riserMm]);
  const link = Math.max(5, (SIDE_WIDTH_PX / (view.toMm[0] - view.fromMm[0])) * reachMm * 0.055);
  const height = printed(spot[1], 0);
  // The words stand where the arm is not.
  const isAtRight = spotX > SIDE_WIDTH_PX * 0.74;

  return (
    <div
      className="relative w-full overflow-hidden border border-hair bg-sheet"
      style={{ aspectRatio: `${SIDE_WIDTH_PX} / ${SIDE_HEIGHT_PX}` }}
    >
      {section && <SectionPicture map={section} riserMm={riserMm} view={view} />}
      <svg
        viewBox={`0 0 ${SIDE_WIDTH_PX} ${SIDE_HEIGHT_PX}`}
        className="absolute inset-0 size-full"
        role="img"
        aria-label={`${reading.robot.name} from the side, tool at ${height} mm over the floor`}
      >
        <path d={`M0 ${floorY}H${SIDE_WIDTH_PX}`} stroke="var(--ink)" strokeWidth="1.2" />
        <rect
          x={plateLeft}
          y={plateTop}
          width={plateRight - plateLeft}
          height={Math.max(2, floorY - plateTop)}
          fill="var(--sheet)"
          stroke="var(--ink)"
          strokeWidth="1.2"
        />
        <path d={`M0 ${toolY}H${SIDE_WIDTH_PX}`} stroke="var(--red)" strokeWidth="1" strokeDasharray="5 3.5" />
        <text
          x={isAtRight ? 4 : SIDE_WIDTH_PX - 4}
          y={toolY - 5}
          textAnchor={isAtRight ? 'start' : 'end'}
          className="font-mono"
          fontSize="12"
          fill="var(--red)"
          stroke="var(--sheet)"
          strokeWidth="3"
          paintOrder="stroke"
        >
          z {height}
        </text>
        {body.length > 1 && (
          <g fill="none" strokeLinejoin="round" strokeLinecap="round">
            <path d={`M${path(body)}`} stroke="var(--ink)" strokeWidth={link + 2.6} />
            <path d={`M${path(body)}`} stroke="var(--sheet)" strokeWidth={link} />
            {body.slice(1, -1).map((point, index) => {
              const [x, y] = px(point);
              return <circle key={index} cx={x} cy={y} r={link * 0.36} fill="var(--sheet)" stroke="var(--ink)" />;
            })}
          </g>
        )}
        <circle cx={spotX} cy={toolY} r="4" fill="var(--red)" stroke="var(--sheet)" strokeWidth="1" />
      </svg>
    </div>
  );
}

/** Joints that fall together are drawn once. */
function distinct(points: readonly SidePoint[]): SidePoint[] {
  return points.filter(
    ([x, y], index) => index === 0 || Math.hypot(x - points[index - 1][0], y - points[index - 1][1]) > 4,
  );
}

interface SectionPictureProps {
  readonly map: SectionMap;
  readonly riserMm: number;
  readonly view: ReturnType<typeof sideView>;
}

function SectionPicture({ map, riserMm, view }: SectionPictureProps) {
  const canvas = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    const ink = canvas.current?.getContext('2d');
    if (!ink) return;
    const table = scaleTable('tide');
    const { from, to } = valueRange('inverseConditionNumber', map.value);
    const image = ink.createImageData(map.columns, map.rows);
    const pixels = new Uint32Array(image.data.buffer);
    for (let row = 0; row < map.rows; row += 1) {
      for (let column = 0; column < map.columns; column += 1) {
        const value = map.value[row * map.columns + column];
        const share = Math.min(1, Math.max(0, (value - from) / (to - from)));
        // Rows of the map go up, rows of a picture go down.
        const pixel = (map.rows - 1 - row) * map.columns + column;
        pixels[pixel] = Number.isNaN(value) ? 0 : table[Math.round(share * (table.length - 1))];
      }
    }
    ink.putImageData(image, 0, 0);
  }, [map]);
  const [left, bottom] = map.originMm.map((value) => value - map.stepMm / 2);
  const [x, lowerY] = sideToPx(view, [left, bottom + riserMm]);
  const [right, upperY] = sideToPx(view, [left + map.columns * map.stepMm, bottom + riserMm + map.rows * map.stepMm]);
  const percent = (value: number, of: number) => `${(100 * value) / of}%`;
  return (
    <canvas
      ref={canvas}
      width={map.columns}
      height={map.rows}
      aria-hidden
      className="absolute [image-rendering:pixelated]"
      style={{
        left: percent(x, SIDE_WIDTH_PX),
        top: percent(upperY, SIDE_HEIGHT_PX),
        width: percent(right - x, SIDE_WIDTH_PX),
        height: percent(lowerY - upperY, SIDE_HEIGHT_PX),
      }}
    />
  );
}
