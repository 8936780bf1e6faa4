'use client';

import { memo } from 'react';
import { Shape } from 'react-konva';
import type { Item } from '@/lib/layout/items';
import type { LengthUnit } from '@/lib/layout/length-units';
import type { Palette } from '@/lib/layout/palette';
import { visibleBounds } from '@/lib/layout/viewport';
import { inkOf, pixelOf } from './ink';
import { drawConveyorName } from './items/conveyor';
import { drawGuardLineName, drawWalkwayName } from './items/lines';
import { drawOutlineName } from './items/outlined';
import { drawRobotName } from './items/robot';
import { drawProtectiveDeviceName, drawZoneName } from './items/zones';
import { robotSizes } from './robot-sticks';
import type { DrawnArm } from './types';

interface ItemNamesProps {
  readonly items: readonly Item[];
  readonly arms: ReadonlyMap<string, DrawnArm>;
  readonly palette: Palette;
  readonly lengthUnit?: LengthUnit;
}

/** Names this far outside the screen may still reach into it, px. */
const MARGIN_PX = 120;
const RADIANS = Math.PI / 180;

/** All names of a canvas in one go, over every body. Lettering is the dearest ink, so names off the screen are left out. */
export const ItemNames = memo(function ItemNames({ items, arms, palette, lengthUnit }: ItemNamesProps) {
  return (
    <Shape
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        const stage = shape.getStage();
        if (!stage) return;
        const seen = visibleBounds(
          { scale: 1 / px, xMm: -stage.x() * px, yMm: stage.y() * px },
          { width: stage.width(), height: stage.height() },
        );
        const margin = MARGIN_PX * px;
        for (const item of items) {
          const size = sizeOf(item) + margin;
          const isSeen =
            item.xMm > seen.minXMm - size &&
            item.xMm < seen.maxXMm + size &&
            item.yMm > seen.minYMm - size &&
            item.yMm < seen.maxYMm + size;
          if (!isSeen) continue;
          ink.save();
          ink.translate(item.xMm, item.yMm);
          ink.rotate(item.angleDeg * RADIANS);
          if (item.kind === 'robot') {
            const reachMm = arms.get(item.armId)?.reachMm ?? 0;
            drawRobotName(ink, palette, px, item, robotSizes(reachMm).baseRadiusMm);
          } else if (item.kind === 'fixture' || item.kind === 'obstacle') drawOutlineName(ink, palette, px, item);
          else if (item.kind === 'guardLine') drawGuardLineName(ink, palette, px, item);
          else if (item.kind === 'zone') drawZoneName(ink, palette, px, item);
          else if (item.kind === 'protectiveDevice') drawProtectiveDeviceName(ink, palette, px, item);
          else if (item.kind === 'conveyor') drawConveyorName(ink, palette, px, item);
          else if (item.kind === 'walkway') drawWalkwayName(ink, palette, px, item, lengthUnit);
          ink.restore();
        }
      }}
    />
  );
});

/** How far an item's own points lie from its place, mm. */
function sizeOf(item: Item): number {
  const points = 'outlineMm' in item ? item.outlineMm : 'pointsMm' in item ? item.pointsMm : [];
  let size = 0;
  for (const [x, y] of points) size = Math.max(size, Math.abs(x), Math.abs(y));
  return size * Math.SQRT2;
}
