'use client';

import { Shape } from 'react-konva';
import { usePalette } from '@/components/sheet/drawing';
import { inkOf, pixelOf, strokeInk } from '@/components/sheet/drawing/ink';
import { useBoardSheet } from './board-context';

/** Marks of a gesture under way that are no items: the rectangle that chooses, and guides to what it snaps to. */
export function DraftMarks() {
  return (
    <>
      <Marquee />
      <Guides />
    </>
  );
}

/** How far a guide stands out beyond what it joins, and the half side of the cross on a single point, px. */
const BEYOND_PX = 10;
const CROSS_PX = 5;

function Guides() {
  const guides = useBoardSheet((state) => state.guides);
  const palette = usePalette();
  if (guides.length === 0) return null;
  return (
    <Shape
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        ink.beginPath();
        for (const { axis, atMm, fromMm, toMm, what } of guides) {
          const line = (from: number, to: number, at: number, upright: boolean) => {
            ink.moveTo(upright ? at : from, upright ? from : at);
            ink.lineTo(upright ? at : to, upright ? to : at);
          };
          line(fromMm - BEYOND_PX * px, toMm + BEYOND_PX * px, atMm, axis === 'x');
          if (what === 'edge' || what === 'centre') continue;
          for (const end of [fromMm, toMm]) line(atMm - CROSS_PX * px, atMm + CROSS_PX * px, end, axis !== 'x');
        }
        strokeInk(ink, palette.petrol, px);
      }}
    />
  );
}

function Marquee() {
  const marquee = useBoardSheet((state) => state.draft?.marquee);
  const palette = usePalette();
  if (!marquee) return null;
  const [[x1, y1], [x2, y2]] = [marquee.from, marquee.to];
  return (
    <Shape
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        ink.beginPath();
        ink.rect(x1, y1, x2 - x1, y2 - y1);
        ink.globalAlpha = 0.08;
        ink.fillStyle = palette.petrol;
        ink.fill();
        ink.globalAlpha = 1;
        ink.setLineDash([5 * px, 3 * px]);
        strokeInk(ink, palette.petrol, px);
        ink.setLineDash([]);
      }}
    />
  );
}
