'use client';

import { Shape } from 'react-konva';
import { inkOf, pixelOf, strokeInk, traceCircle } from './ink';
import { usePalette } from './use-palette';

const ARM_PX = 16;
const RING_PX = 7;

/** A red cross on the spot that something new is about. Inside an OverlayLayer. */
export function Crosshair({ xMm, yMm }: { readonly xMm: number; readonly yMm: number }) {
  const palette = usePalette();
  return (
    <Shape
      x={xMm}
      y={yMm}
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        const trace = () => {
          traceCircle(ink, 0, 0, RING_PX * px);
          for (const [x, y] of [
            [1, 0],
            [-1, 0],
            [0, 1],
            [0, -1],
          ]) {
            ink.moveTo(x * 3 * px, y * 3 * px);
            ink.lineTo(x * ARM_PX * px, y * ARM_PX * px);
          }
        };
        trace();
        strokeInk(ink, palette.sheet, 5 * px);
        trace();
        strokeInk(ink, palette.red, 2 * px);
      }}
    />
  );
}
