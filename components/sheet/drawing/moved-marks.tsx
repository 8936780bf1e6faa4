'use client';

import { memo } from 'react';
import { Shape } from 'react-konva';
import type { Item } from '@/lib/layout/items';
import { inkOf, pixelOf, strokeInk, traceCircle, tracePath } from './ink';
import { frameOfItem } from './item-frame';
import type { DrawnArm } from './types';
import { usePalette } from './use-palette';

interface MovedMarksProps {
  readonly moves: readonly { readonly left: Item; readonly right: Item }[];
  readonly arms: ReadonlyMap<string, DrawnArm>;
}

/** Where things stood before: dashed outlines, each with an arrow to where it stands now. Inside an OverlayLayer. */
export const MovedMarks = memo(function MovedMarks({ moves, arms }: MovedMarksProps) {
  const palette = usePalette('share');
  return (
    <Shape
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        ink.setLineDash([4 * px, 3 * px]);
        for (const { left, right } of moves) {
          const frame = frameOfItem(left, arms);
          ink.save();
          ink.translate(left.xMm, left.yMm);
          ink.rotate((left.angleDeg * Math.PI) / 180);
          if (frame.round) traceCircle(ink, 0, 0, frame.maxX);
          else if ('outlineMm' in left) tracePath(ink, left.outlineMm, true);
          else if ('pointsMm' in left) tracePath(ink, left.pointsMm, left.kind === 'guardLine' && left.closed);
          else ink.beginPath();
          strokeInk(ink, palette.inkSoft, 1.3 * px);
          ink.restore();
          ink.beginPath();
          ink.moveTo(left.xMm, left.yMm);
          ink.lineTo(right.xMm, right.yMm);
          strokeInk(ink, palette.inkSoft, 1.3 * px);
        }
        ink.setLineDash([]);
        ink.fillStyle = palette.inkSoft;
        for (const { left, right } of moves) {
          const along = Math.atan2(right.yMm - left.yMm, right.xMm - left.xMm);
          if (Math.hypot(right.xMm - left.xMm, right.yMm - left.yMm) < 12 * px) continue;
          ink.save();
          ink.translate(right.xMm, right.yMm);
          ink.rotate(along);
          tracePath(
            ink,
            [
              [0, 0],
              [-9 * px, 3.2 * px],
              [-9 * px, -3.2 * px],
            ],
            true,
          );
          ink.fill();
          ink.restore();
        }
      }}
    />
  );
});
