'use client';

import { memo, useMemo, useState } from 'react';
import { Shape } from 'react-konva';
import { belowOutline, branchEdges, isoLines as traceIsoLines, reachOutline, realmEdges } from '@/lib/layout/contours';
import type { FloorMap } from '@/lib/layout/floor-map';
import type { MapScale, ValueRange } from '@/lib/layout/scales';
import { drawGroundImage, drawHatchEdge, drawHatched, drawIsoLines, drawRealmEdges, pathOf } from './draw-map';
import { inkOf, pixelOf } from './ink';
import { MapPainter } from './map-image';
import type { DrawingMode } from './types';
import { usePalette } from './use-palette';

export interface MapLayerProps {
  readonly map: FloorMap | null;
  readonly scale: MapScale;
  /** Values at the ends of the scale: fixed and shared where maps are compared. */
  readonly range: ValueRange;
  /** Reached floor below this is hatched; null for no line. */
  readonly threshold?: number | null;
  /** Values of the lines of equal value; leave out while a map follows a drag. Must keep its identity between renders. */
  readonly isoLines?: readonly number[] | null;
  readonly opacity?: number;
  /** Thin edges where one robot's best branch changes; leave out while a map follows a drag. */
  readonly showsBranches?: boolean;
  readonly mode?: DrawingMode;
}

/** The composite of all robots' maps, under the linework. */
export const MapLayer = memo(function MapLayer(props: MapLayerProps) {
  const { map, scale, range, threshold = null, isoLines = null, showsBranches = false, opacity = 1, mode } = props;
  const palette = usePalette(mode);
  const [painter] = useState(() => new MapPainter());
  const image = useMemo(() => map && painter.map(map, scale, range), [painter, map, scale, range]);
  const reached = useMemo(() => map && pathOf(reachOutline(map)), [map]);
  const edges = useMemo(() => map && realmEdges(map, map.robot), [map]);
  const branches = useMemo(() => (map && showsBranches ? branchEdges(map) : null), [map, showsBranches]);
  const hatched = useMemo(
    () => (map && threshold !== null && map.measure !== 'reach' ? pathOf(belowOutline(map, threshold)) : null),
    [map, threshold],
  );
  const lines = useMemo(
    () => (map && isoLines && map.measure !== 'reach' ? traceIsoLines(map, isoLines) : null),
    [map, isoLines],
  );

  if (!image || !reached || !edges) return null;
  return (
    <Shape
      listening={false}
      opacity={opacity}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        ink.save();
        ink.clip(reached, 'evenodd');
        drawGroundImage(ink, image.canvas, image.grid, px);
        if (hatched) drawHatched(ink, palette, px, hatched, palette.red);
        ink.restore();
        if (branches) drawRealmEdges(ink, palette, px, branches, 0.6);
        drawRealmEdges(ink, palette, px, edges);
        if (lines) drawIsoLines(ink, palette, px, lines);
        drawHatchEdge(ink, palette, px, reached, image.grid);
      }}
    />
  );
});
