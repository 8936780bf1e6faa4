'use client';

import { memo, useMemo } from 'react';
import { Image as KonvaImage } from 'react-konva';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import { pictureForBoard } from './picture-for-board';
import type { DrawingMode } from './types';
import { usePalette } from './use-palette';
import { usePicture } from './use-picture';
import { useStageFrame } from './viewport-context';

export interface FloorPlanLayerProps {
  readonly floorPlan: FloorPlan | null;
  /** Where the picture of at least this width is to be had; must keep its identity between renders. */
  readonly pictureUrl: (widthPx: number) => string;
  readonly opacity?: number;
  readonly mode?: DrawingMode;
}

/** The stored width that is sharp enough at this zoom; the largest where none is. */
export function pictureWidthFor(floorPlan: FloorPlan, scale: number, devicePixels: number): number {
  const mmPerPx = floorPlan.calibration?.mmPerPx ?? 1;
  const wanted = floorPlan.widthPx * mmPerPx * scale * devicePixels;
  const widths = floorPlan.pictureWidths;
  return widths.find((width) => width >= wanted) ?? widths.at(-1) ?? floorPlan.widthPx;
}

/** The floor plan's picture where its calibration puts it. A plan that is not set to scale yet is not drawn. */
export const FloorPlanLayer = memo(function FloorPlanLayer(props: FloorPlanLayerProps) {
  const { floorPlan } = props;
  // Another plan starts anew: the old picture must not stand in at the new one's scale.
  return floorPlan?.calibration ? <PlacedPicture key={floorPlan.id} {...props} floorPlan={floorPlan} /> : null;
});

function PlacedPicture(props: FloorPlanLayerProps & { readonly floorPlan: FloorPlan }) {
  const { floorPlan, pictureUrl, opacity = 1, mode } = props;
  const { viewport } = useStageFrame();
  const devicePixels = typeof window === 'undefined' ? 1 : window.devicePixelRatio;
  const picture = usePicture(pictureUrl(pictureWidthFor(floorPlan, viewport.scale, devicePixels)));
  const { board } = usePalette(mode);
  const drawn = useMemo(() => picture && pictureForBoard(picture, board), [picture, board]);

  const { calibration } = floorPlan;
  if (!calibration || !drawn) return null;
  return (
    <KonvaImage
      image={drawn}
      width={floorPlan.widthPx}
      height={floorPlan.heightPx}
      offsetX={calibration.originPx[0]}
      offsetY={calibration.originPx[1]}
      rotation={calibration.rotationDeg}
      scaleX={calibration.mmPerPx}
      scaleY={-calibration.mmPerPx}
      opacity={opacity}
      // Ink of the plan over the colours of the map, as on tracing paper.
      globalCompositeOperation={board === 'day' ? 'multiply' : 'screen'}
      listening={false}
      perfectDrawEnabled={false}
    />
  );
}
