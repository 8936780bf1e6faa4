'use client';

import { Shape } from 'react-konva';
import { usePalette } from '@/components/sheet/drawing';
import { inkOf, pixelOf, strokeInk } from '@/components/sheet/drawing/ink';
import { useBoardSheet } from './board-context';

/** Marks of a gesture under way that are no items: the rectangle that chooses. */
export function DraftMarks() {
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
