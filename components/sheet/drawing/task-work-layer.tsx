'use client';

import { memo } from 'react';
import { Layer, Shape } from 'react-konva';
import { inkOf, letter, pixelOf } from './ink';
import { drawPath, drawPattern, type DrawnPath, type DrawnPattern } from './items/task-work';
import type { DrawingMode } from './types';
import { usePalette } from './use-palette';

export interface TaskWorkLayerProps {
  readonly paths: readonly DrawnPath[];
  readonly patterns: readonly DrawnPattern[];
  readonly chosenId?: string | null;
  readonly mode: DrawingMode;
}

/** Task paths and patterns over the fixtures that carry them. Takes no presses: the lists choose them. */
export const TaskWorkLayer = memo(function TaskWorkLayer({ paths, patterns, chosenId, mode }: TaskWorkLayerProps) {
  const palette = usePalette(mode);
  if (paths.length + patterns.length === 0) return null;
  return (
    <Layer listening={false}>
      <Shape
        name="task-work"
        perfectDrawEnabled={false}
        sceneFunc={(context, shape) => {
          const ink = inkOf(context);
          const px = pixelOf(shape);
          for (const pattern of patterns) drawPattern(ink, palette, px, pattern, pattern.id === chosenId);
          for (const path of paths) drawPath(ink, palette, px, path, path.id === chosenId);
          const named = [
            ...paths.map(({ id, name, line }) => ({ id, name, at: line[0] })),
            ...patterns.map(({ id, name, places }) => ({ id, name, at: places[0]?.at })),
          ].find(({ id }) => id === chosenId);
          if (named?.at)
            letter(ink, palette, px, {
              text: named.name,
              xMm: named.at[0],
              yMm: named.at[1],
              offsetPx: [0, -15],
              weight: 600,
            });
        }}
      />
    </Layer>
  );
});
