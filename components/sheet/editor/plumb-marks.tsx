'use client';

import { useMemo } from 'react';
import { Shape } from 'react-konva';
import { usePalette } from '@/components/sheet/drawing';
import { inkOf, pixelOf, strokeInk, traceCircle, tracePath } from '@/components/sheet/drawing/ink';
import { plumbSpeeds } from '@/lib/editor/plumb';
import { useBoardSettings } from './board-context';
import { usePlumb } from './readings-context';

/** Millimetres of floor for a metre a second, so that shapes of two spots can be compared by eye. */
const MM_PER_MPS = 110;

/** The plumb where it hangs, with what the tool can do there: the velocity polygon, and its ellipse dashed. */
export function PlumbMarks() {
  const { spot, reading, posture } = usePlumb();
  const { wrist } = useBoardSettings();
  const palette = usePalette();
  const speeds = useMemo(
    () => (reading && posture ? plumbSpeeds(reading, posture, wrist).floor : null),
    [reading, posture, wrist],
  );
  if (!spot) return null;
  const [x, y] = spot.positionMm;
  return (
    <Shape
      x={x}
      y={y}
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        if (speeds && speeds.polygon.length > 1) {
          tracePath(
            ink,
            speeds.polygon.map(([vx, vy]) => [vx * MM_PER_MPS, vy * MM_PER_MPS] as const),
            true,
          );
          ink.globalAlpha = 0.22;
          ink.fillStyle = palette.petrol;
          ink.fill();
          ink.globalAlpha = 1;
          strokeInk(ink, palette.petrol, 1.5 * px);
          const { major, minor, angleDeg } = speeds.ellipse;
          ink.save();
          ink.rotate((angleDeg * Math.PI) / 180);
          ink.beginPath();
          ink.ellipse(0, 0, major * MM_PER_MPS, minor * MM_PER_MPS, 0, 0, 2 * Math.PI);
          ink.restore();
          ink.setLineDash([3 * px, 2.5 * px]);
          strokeInk(ink, palette.ink, px);
          ink.setLineDash([]);
        }
        const arm = 9 * px;
        ink.beginPath();
        ink.moveTo(-arm, 0);
        ink.lineTo(arm, 0);
        ink.moveTo(0, -arm);
        ink.lineTo(0, arm);
        strokeInk(ink, palette.sheet, 3.5 * px);
        strokeInk(ink, palette.red, 1.2 * px);
        traceCircle(ink, 0, 0, 4 * px);
        ink.fillStyle = palette.red;
        ink.fill();
        strokeInk(ink, palette.sheet, 1.2 * px);
      }}
    />
  );
}
