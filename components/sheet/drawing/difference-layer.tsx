'use client';

import { memo, useMemo, useState } from 'react';
import { Shape } from 'react-konva';
import { reachOutline } from '@/lib/layout/contours';
import { CELL_CHANGES, type FloorDifference } from '@/lib/layout/floor-figures';
import { drawGroundImage, drawHatchEdge, drawHatched, pathOf } from './draw-map';
import { inkOf, pixelOf } from './ink';
import { MapPainter } from './map-image';
import { usePalette } from './use-palette';

interface DifferenceLayerProps {
  readonly difference: FloorDifference | null;
  /** The change at the ends of the scale. */
  readonly limit: number;
}

const NEITHER = CELL_CHANGES.indexOf('neither');
const BOTH = CELL_CHANGES.indexOf('both');

/** What changes between two maps: petrol for more, red for less, paper for none; floor won or lost altogether is hatched. */
export const DifferenceLayer = memo(function DifferenceLayer({ difference, limit }: DifferenceLayerProps) {
  const palette = usePalette('share');
  const [painter] = useState(() => new MapPainter());
  const image = useMemo(
    () => difference && painter.difference(difference, limit, palette.board),
    [painter, difference, limit, palette.board],
  );
  const reached = useMemo(() => difference && outline(difference, (change) => change !== NEITHER), [difference]);
  const turned = useMemo(
    () => difference && outline(difference, (change) => change !== NEITHER && change !== BOTH),
    [difference],
  );
  if (!image || !reached || !turned) return null;
  return (
    <Shape
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        ink.save();
        ink.clip(reached, 'evenodd');
        drawGroundImage(ink, image.canvas, image.grid, px);
        ink.restore();
        drawHatched(ink, palette, px, turned, null);
        drawHatchEdge(ink, palette, px, reached, image.grid);
      }}
    />
  );
});

function outline(difference: FloorDifference, belongs: (change: number) => boolean): Path2D {
  const value = Float32Array.from(difference.change, (change) => (belongs(change) ? 1 : NaN));
  return pathOf(reachOutline({ grid: difference.grid, value }));
}
