'use client';

import { useEffect, useMemo, useRef, useState } from 'react';
import type { MapLook } from '@/components/sheet/editor/use-map-look';
import { MapPainter } from '@/components/sheet/drawing/map-image';
import { useUnits } from '@/lib/client/use-units';
import { isoLines as traceIsoLines, reachOutline } from '@/lib/layout/contours';
import type { FloorMap } from '@/lib/layout/floor-map';
import { cutLengthMm, type Cut } from '@/lib/layout/section-cut';
import { marksOf, type CutPoint, type Silhouette } from './section-figures';

/** Room for the lettering of heights at the left and of lengths below, px. */
const LEFT_PX = 52;
const FOOT_PX = 20;
const TOP_PX = 8;
const MARK_ROOM_PX = 64;
const HEIGHT_ROOM_PX = 26;

interface SectionDrawingProps {
  readonly cut: Cut;
  readonly letter: string;
  readonly map: FloorMap | null;
  readonly look: MapLook;
  /** Lines of equal value are traced once nothing moves. */
  readonly isFine: boolean;
  readonly silhouettes: readonly Silhouette[];
  /** Dashed, where it lies within the cut. */
  readonly toolHeightMm: number;
  readonly pxPerMm: number;
}

/** A cut to scale: its map, its axes, and the arms that work in it seen from the side. */
export function SectionDrawing(props: SectionDrawingProps) {
  const { cut, letter, map, look, isFine, silhouettes, toolHeightMm, pxPerMm } = props;
  const { figure, unit } = useUnits();
  const width = cutLengthMm(cut) * pxPerMm;
  const height = (cut.zToMm - cut.zFromMm) * pxPerMm;
  const x = (alongMm: number) => LEFT_PX + alongMm * pxPerMm;
  const y = (heightMm: number) => TOP_PX + (cut.zToMm - heightMm) * pxPerMm;
  const path = (points: readonly CutPoint[]) =>
    points.map(([along, up], at) => `${at ? 'L' : 'M'}${x(along).toFixed(1)} ${y(up).toFixed(1)}`).join('');
  const outline = useMemo(() => (map ? reachOutline(map) : []), [map]);
  const lines = useMemo(
    () => (map && isFine && look.isoLines && map.measure !== 'reach' ? traceIsoLines(map, look.isoLines) : []),
    [map, isFine, look.isoLines],
  );
  const isToolHere = toolHeightMm >= cut.zFromMm && toolHeightMm <= cut.zToMm;
  const names = silhouettes.map(({ name }) => name).join(', ');
  return (
    <div className="relative" style={{ width: width + LEFT_PX + 8, height: height + TOP_PX + FOOT_PX }}>
      {map && <SectionPicture map={map} look={look} style={{ left: LEFT_PX, top: TOP_PX, width, height }} />}
      <svg
        width={width + LEFT_PX + 8}
        height={height + TOP_PX + FOOT_PX}
        role="img"
        aria-label={`Section ${letter}–${letter} from the side${names ? `, with ${names}` : ''}`}
        className="absolute inset-0"
      >
        <clipPath id={`cut-${letter}`}>
          <rect x={LEFT_PX} y={TOP_PX} width={width} height={height} />
        </clipPath>
        <rect x={LEFT_PX} y={TOP_PX} width={width} height={height} fill="none" stroke="var(--rule)" />
        <g className="font-mono" fontSize="10.5" fill="var(--ink-soft)">
          {marksOf(0, cutLengthMm(cut), pxPerMm, MARK_ROOM_PX).map((mm) => (
            <g key={mm}>
              <path d={`M${x(mm)} ${TOP_PX + height}v4`} stroke="var(--ink-soft)" />
              <text x={x(mm)} y={TOP_PX + height + 15} textAnchor={mm === 0 ? 'start' : 'middle'}>
                {mm === 0 ? `0 ${unit}` : figure(mm, 0)}
              </text>
            </g>
          ))}
          {marksOf(cut.zFromMm, cut.zToMm, pxPerMm, HEIGHT_ROOM_PX).map((mm) => (
            <g key={mm}>
              <path d={`M${LEFT_PX - 4} ${y(mm)}h4`} stroke="var(--ink-soft)" />
              <text x={LEFT_PX - 7} y={y(mm) + 3.5} textAnchor="end">
                {figure(mm, 0)}
              </text>
            </g>
          ))}
        </g>
        <g clipPath={`url(#cut-${letter})`} fill="none" strokeLinejoin="round" strokeLinecap="round">
          <path d={outline.map((ring) => `${path(ring)}Z`).join('')} stroke="var(--ink-soft)" strokeOpacity="0.55" />
          <path
            d={lines.flatMap((line) => line.lines.map(path)).join('')}
            stroke="var(--ink)"
            strokeOpacity="0.4"
            strokeWidth="0.8"
          />
          <path d={`M${LEFT_PX} ${y(0)}h${width}`} stroke="var(--ink)" strokeWidth="1.4" />
          {isToolHere && (
            <path d={`M${LEFT_PX} ${y(toolHeightMm)}h${width}`} stroke="var(--red)" strokeDasharray="5 3.5" />
          )}
          {silhouettes.map(({ robotId, body, base, linkWidthMm, isNear }) => {
            const link = Math.max(3, linkWidthMm * pxPerMm);
            const plate = linkWidthMm * 1.7;
            const [left, right, top] = [x(base[0] - plate), x(base[0] + plate), y(base[1])];
            return (
              <g key={robotId} opacity={isNear ? 1 : 0.45}>
                <rect
                  x={left}
                  y={top}
                  width={right - left}
                  height={Math.max(2, y(0) - top)}
                  fill="var(--sheet)"
                  stroke="var(--ink)"
                />
                <path d={path(body)} stroke="var(--ink)" strokeWidth={link + 2.2} />
                <path d={path(body)} stroke="var(--sheet)" strokeWidth={link} />
              </g>
            );
          })}
        </g>
        <g fontSize="11" fontWeight="600" fill="var(--ink)" stroke="var(--sheet)" strokeWidth="3" paintOrder="stroke">
          {silhouettes.map(({ robotId, name, base }) => (
            <text key={robotId} x={Math.min(x(base[0]) + 8, LEFT_PX + width - 20)} y={y(0) - 5}>
              {name}
            </text>
          ))}
          <text x={LEFT_PX + 5} y={TOP_PX + 14}>
            {letter}
          </text>
          <text x={LEFT_PX + width - 5} y={TOP_PX + 14} textAnchor="end">
            {letter}
          </text>
        </g>
      </svg>
    </div>
  );
}

function SectionPicture({ map, look, style }: { map: FloorMap; look: MapLook; style: React.CSSProperties }) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const [painter] = useState(() => new MapPainter());
  const { columns, rows } = map.grid;
  useEffect(() => {
    const ink = canvas.current?.getContext('2d');
    if (!ink) return;
    const image = painter.map(map, look.scale, look.range);
    ink.clearRect(0, 0, columns, rows);
    // Rows of the map go up, rows of a picture go down.
    ink.setTransform(1, 0, 0, -1, 0, rows);
    ink.drawImage(image.canvas, 0, 0);
    ink.resetTransform();
  }, [painter, map, look.scale, look.range, columns, rows]);
  return (
    <canvas
      ref={canvas}
      width={columns}
      height={rows}
      aria-hidden
      data-section-cells={columns * rows}
      className="absolute [image-rendering:pixelated]"
      style={style}
    />
  );
}
