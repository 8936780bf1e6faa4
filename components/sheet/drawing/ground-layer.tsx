'use client';

import type { ReactNode } from 'react';
import { Layer, Shape } from 'react-konva';
import { visibleBounds } from '@/lib/layout/viewport';
import { inkOf } from './ink';
import type { DrawingMode } from './types';
import { usePalette } from './use-palette';
import { useStageFrame } from './viewport-context';

/**
 * What lies under the linework, on one canvas so that the plan can be multiplied over the map:
 * MapLayer, GridLayer and FloorPlanLayer, in that order.
 */
export function GroundLayer({ children, mode }: { readonly children: ReactNode; readonly mode?: DrawingMode }) {
  return (
    <Layer listening={false}>
      <Paper mode={mode} />
      {children}
    </Layer>
  );
}

/** The sheet itself: without it there would be nothing for the plan's white to be multiplied with. */
function Paper({ mode }: { readonly mode?: DrawingMode }) {
  const { viewport, width, height } = useStageFrame();
  const { sheet } = usePalette(mode);
  const seen = visibleBounds(viewport, { width, height });
  return (
    <Shape
      listening={false}
      sceneFunc={(context) => {
        const ink = inkOf(context);
        ink.fillStyle = sheet;
        ink.fillRect(seen.minXMm, seen.minYMm, seen.maxXMm - seen.minXMm, seen.maxYMm - seen.minYMm);
      }}
    />
  );
}

/** What lies over the items: SelectionHandles, RemarkPins and a tool's own marks. */
export function OverlayLayer({
  children,
  listening = true,
}: {
  readonly children: ReactNode;
  readonly listening?: boolean;
}) {
  return <Layer listening={listening}>{children}</Layer>;
}
