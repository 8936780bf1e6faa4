'use client';

import { memo, useMemo } from 'react';
import type Konva from 'konva';
import { Shape } from 'react-konva';
import type { Item } from '@/lib/layout/items';
import type { LengthUnit } from '@/lib/layout/length-units';
import type { Palette } from '@/lib/layout/palette';
import { drawConveyor } from './items/conveyor';
import { drawDimension, drawGuardLine, drawWalkway } from './items/lines';
import { drawNote } from './items/note';
import { drawFixture, drawObstacle } from './items/outlined';
import { drawReachRing, drawRobot } from './items/robot';
import { drawSectionLine } from './items/section-line';
import { drawTaskPoints, taskPointAt } from './items/task-points';
import { drawProtectiveDevice, drawZone } from './items/zones';
import { traceHit } from './hit-areas';
import { inkOf, pixelOf } from './ink';
import { robotSizes, robotSticks } from './robot-sticks';
import type { DrawingMode, DrawnArm, DrawnBand, SheetPointer } from './types';

export interface ItemShapeProps {
  readonly item: Item;
  readonly arm?: DrawnArm;
  readonly posture?: readonly number[];
  readonly verdicts?: ReadonlyMap<string, DrawnBand>;
  readonly selectedTaskPointId: string | null;
  readonly chosen: boolean;
  readonly mode: DrawingMode;
  readonly palette: Palette;
  readonly lengthUnit?: LengthUnit;
  readonly onItemPointerDown?: (itemId: string, pointer: SheetPointer) => void;
  readonly onTaskPointPointerDown?: (fixtureId: string, taskPointId: string, pointer: SheetPointer) => void;
}

const NO_STICKS = { sticks: [], joints: [], toolPoint: [0, 0] } as const;

/** One item as one canvas node, drawn by the draw function of its kind. */
export const ItemShape = memo(function ItemShape(props: ItemShapeProps) {
  const { item, arm, posture, verdicts, selectedTaskPointId, chosen, palette, lengthUnit } = props;
  const reachMm = arm?.reachMm ?? 0;
  const tool = item.kind === 'robot' ? item.tool : null;
  const robot = useMemo(
    () =>
      arm && tool && posture
        ? robotSticks(arm.definition, tool, posture, reachMm)
        : { ...NO_STICKS, ...robotSizes(reachMm) },
    [arm, tool, posture, reachMm],
  );

  const draw = (context: Konva.Context, shape: Konva.Shape) => {
    const ink = inkOf(context);
    const px = pixelOf(shape);
    switch (item.kind) {
      case 'robot':
        if (chosen && reachMm > 0) drawReachRing(ink, palette, px, reachMm);
        return drawRobot(ink, palette, px, robot, posture !== undefined);
      case 'fixture':
        drawFixture(ink, palette, px, item);
        return drawTaskPoints(ink, palette, px, item, verdicts, selectedTaskPointId, chosen);
      case 'obstacle':
        return drawObstacle(ink, palette, px, item);
      case 'guardLine':
        return drawGuardLine(ink, palette, px, item);
      case 'walkway':
        return drawWalkway(ink, palette, px, item);
      case 'dimension':
        return drawDimension(ink, palette, px, item, lengthUnit);
      case 'conveyor':
        return drawConveyor(ink, palette, px, item);
      case 'sectionLine':
        return drawSectionLine(ink, palette, px, item);
      case 'note':
        return drawNote(ink, palette, px, item);
      case 'zone':
        return drawZone(ink, palette, px, item);
      case 'protectiveDevice':
        return drawProtectiveDevice(ink, palette, px, item);
    }
  };

  const onPointerDown = (event: Konva.KonvaEventObject<PointerEvent>) => {
    const stage = event.target.getStage();
    const screen = stage?.getPointerPosition();
    const floor = stage?.getRelativePointerPosition();
    const local = event.target.getRelativePointerPosition();
    if (!screen || !floor || !local) return;
    const pointer = { screen, floor: { xMm: floor.x, yMm: floor.y }, event: event.evt };
    if (item.kind === 'fixture' && props.onTaskPointPointerDown) {
      const point = taskPointAt(item, local.x, local.y, pixelOf(event.target));
      if (point) return props.onTaskPointPointerDown(item.id, point.id, pointer);
    }
    props.onItemPointerDown?.(item.id, pointer);
  };

  const listening = props.mode === 'edit' && props.onItemPointerDown !== undefined;
  return (
    <Shape
      name={`item-${item.kind}`}
      x={item.xMm}
      y={item.yMm}
      rotation={item.angleDeg}
      listening={listening}
      perfectDrawEnabled={false}
      sceneFunc={draw}
      hitFunc={listening ? (context, shape) => traceHit(context, shape, item, robot.baseRadiusMm) : undefined}
      onPointerDown={listening ? onPointerDown : undefined}
    />
  );
});
