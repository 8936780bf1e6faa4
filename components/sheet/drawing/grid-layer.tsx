'use client';

import { memo } from 'react';
import { Shape } from 'react-konva';
import { visibleBounds } from '@/lib/layout/viewport';
import { inkOf, pixelOf } from './ink';
import type { DrawingMode } from './types';
import { usePalette } from './use-palette';
import { useStageFrame } from './viewport-context';

/** Metric steps of the fine lines; every fifth or tenth is a stronger one. */
const STEPS: readonly { readonly fineMm: number; readonly coarseMm: number }[] = [
  { fineMm: 100, coarseMm: 500 },
  { fineMm: 500, coarseMm: 1000 },
  { fineMm: 1000, coarseMm: 5000 },
  { fineMm: 5000, coarseMm: 10_000 },
  { fineMm: 10_000, coarseMm: 50_000 },
];
const LEAST_GAP_PX = 22;

/** The steps of the grid at this scale (px/mm): the finest whose lines stand at least 22 px apart. */
export function gridStepsFor(scale: number): { readonly fineMm: number; readonly coarseMm: number } {
  return STEPS.find(({ fineMm }) => fineMm * scale >= LEAST_GAP_PX) ?? STEPS[STEPS.length - 1];
}

/** The metric grid of the floor, counted from its origin, over the part that is seen. */
export const GridLayer = memo(function GridLayer({ mode }: { readonly mode?: DrawingMode }) {
  const { viewport, width, height } = useStageFrame();
  const palette = usePalette(mode);
  const { fineMm, coarseMm } = gridStepsFor(viewport.scale);
  return (
    <Shape
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        const seen = visibleBounds(viewport, { width, height });
        ink.lineWidth = px;
        ink.strokeStyle = palette.ink;
        for (const [stepMm, strength] of [
          [fineMm, 0.055],
          [coarseMm, 0.07],
        ] as const) {
          ink.globalAlpha = strength;
          ink.beginPath();
          for (let x = Math.ceil(seen.minXMm / stepMm) * stepMm; x <= seen.maxXMm; x += stepMm) {
            ink.moveTo(x, seen.minYMm);
            ink.lineTo(x, seen.maxYMm);
          }
          for (let y = Math.ceil(seen.minYMm / stepMm) * stepMm; y <= seen.maxYMm; y += stepMm) {
            ink.moveTo(seen.minXMm, y);
            ink.lineTo(seen.maxXMm, y);
          }
          ink.stroke();
        }
        ink.globalAlpha = 1;
      }}
    />
  );
});
