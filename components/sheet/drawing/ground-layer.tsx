'use client';

import type { ReactNode } from 'react';
import { Layer } from 'react-konva';

/**
 * What lies under the linework, on one canvas so that the plan can be multiplied over the map:
 * MapLayer, GridLayer and FloorPlanLayer, in that order.
 */
export function GroundLayer({ children }: { readonly children: ReactNode }) {
  return <Layer listening={false}>{children}</Layer>;
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
