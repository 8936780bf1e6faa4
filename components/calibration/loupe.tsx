'use client';

import { useEffect, useRef } from 'react';
import { classNames } from '@/components/ui/class-names';
import { DAY_PALETTE } from '@/lib/layout/palette';
import type { PicturePoint } from '@/lib/layout/picture-view';

interface LoupeProps {
  picture: HTMLImageElement;
  /** Width of the picture that points count in; the one loaded may be smaller. */
  widthPx: number;
  point: PicturePoint;
  onRight: boolean;
}

const SIDE_PX = 150;
/** Screen pixels a picture pixel. */
const ZOOM = 6;

/** The surroundings of the point aimed at, enlarged, and its pixel numbers. */
export function Loupe({ picture, widthPx, point: [xPx, yPx], onRight }: LoupeProps) {
  const canvas = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    const ink = canvas.current?.getContext('2d');
    if (!ink) return;
    const density = picture.naturalWidth / widthPx;
    const span = (SIDE_PX / ZOOM) * density;
    ink.fillStyle = DAY_PALETTE.paper;
    ink.fillRect(0, 0, SIDE_PX, SIDE_PX);
    ink.imageSmoothingEnabled = false;
    ink.drawImage(picture, xPx * density - span / 2, yPx * density - span / 2, span, span, 0, 0, SIDE_PX, SIDE_PX);
    ink.strokeStyle = DAY_PALETTE.red;
    ink.lineWidth = 1;
    ink.beginPath();
    const half = SIDE_PX / 2;
    for (const [from, to] of [
      [0, half - ZOOM],
      [half + ZOOM, SIDE_PX],
    ]) {
      ink.moveTo(half, from);
      ink.lineTo(half, to);
      ink.moveTo(from, half);
      ink.lineTo(to, half);
    }
    ink.stroke();
  }, [picture, widthPx, xPx, yPx]);
  return (
    <div
      aria-hidden
      className={classNames(
        'pointer-events-none absolute top-3 border border-rule bg-sheet',
        onRight ? 'right-3' : 'left-3',
      )}
    >
      <canvas ref={canvas} width={SIDE_PX} height={SIDE_PX} className="block" />
      <p className="border-t border-rule px-2 py-0.5 text-center font-mono text-sm">
        {xPx.toFixed(1)}, {yPx.toFixed(1)} px
      </p>
    </div>
  );
}
