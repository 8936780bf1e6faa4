'use client';

import { memo } from 'react';
import type Konva from 'konva';
import { Shape } from 'react-konva';
import type { Item } from '@/lib/layout/items';
import { inkOf, pixelOf, strokeInk, traceCircle, type Ink } from './ink';
import { frameOfItem, type ItemFrame } from './item-frame';
import type { DrawnArm, SheetPointer } from './types';
import { usePalette } from './use-palette';

export interface SelectionHandlesProps {
  /** The chosen items as they stand now. Handles appear where exactly one is chosen and it is not locked. */
  readonly items: readonly Item[];
  readonly arms: ReadonlyMap<string, DrawnArm>;
  readonly onHandlePointerDown?: (handle: 'move' | 'rotate', pointer: SheetPointer) => void;
}

/** Taken hold of anywhere on themselves; a cross in the middle would only lie over task points. */
const BODIES: ReadonlySet<Item['kind']> = new Set(['robot', 'fixture', 'obstacle', 'conveyor', 'note']);

const GAP_PX = 6;
const TURN_ARM_PX = 26;
const HANDLE_PX = 5.5;

/** Outline of the chosen items and, for a single one, a cross to move and a knob to turn it. Inside an OverlayLayer. */
export function SelectionHandles({ items, arms, onHandlePointerDown }: SelectionHandlesProps) {
  const single = items.length === 1 && !items[0].locked ? items[0] : null;
  return (
    <>
      {items.map((item) => (
        <Outline key={item.id} item={item} frame={frameOfItem(item, arms)} />
      ))}
      {single && single.kind !== 'dimension' && (
        <Handle item={single} frame={frameOfItem(single, arms)} kind="rotate" onPress={onHandlePointerDown} />
      )}
      {single && !BODIES.has(single.kind) && (
        <Handle item={single} frame={frameOfItem(single, arms)} kind="move" onPress={onHandlePointerDown} />
      )}
    </>
  );
}

interface PartProps {
  readonly item: Item;
  readonly frame: ItemFrame;
}

const Outline = memo(function Outline({ item, frame }: PartProps) {
  const palette = usePalette();
  return (
    <Shape
      x={item.xMm}
      y={item.yMm}
      rotation={item.angleDeg}
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        const gap = GAP_PX * px;
        if (frame.round) traceCircle(ink, 0, 0, frame.maxX + gap);
        else {
          ink.beginPath();
          ink.rect(
            frame.minX - gap,
            frame.minY - gap,
            frame.maxX - frame.minX + 2 * gap,
            frame.maxY - frame.minY + 2 * gap,
          );
        }
        strokeInk(ink, palette.petrol, 1.5 * px);
      }}
    />
  );
});

interface HandleProps extends PartProps {
  readonly kind: 'move' | 'rotate';
  readonly onPress: SelectionHandlesProps['onHandlePointerDown'];
}

/** The knob stands off the item's right side, where angle 0 points: it shows the turn as well as changing it. */
const Handle = memo(function Handle({ item, frame, kind, onPress }: HandleProps) {
  const palette = usePalette();
  const middleY = frame.round ? 0 : (frame.minY + frame.maxY) / 2;
  const middleX = frame.round ? 0 : (frame.minX + frame.maxX) / 2;
  const placeOf = (px: number): readonly [number, number] =>
    kind === 'rotate' ? [frame.maxX + (GAP_PX + TURN_ARM_PX) * px, middleY] : [middleX, middleY];
  const drawKnob = (ink: Ink, px: number) => {
    const [x, y] = placeOf(px);
    if (kind === 'rotate') {
      ink.beginPath();
      ink.moveTo(frame.maxX + GAP_PX * px, middleY);
      ink.lineTo(x - HANDLE_PX * px, y);
      strokeInk(ink, palette.petrol, 1.5 * px);
      traceCircle(ink, x, y, HANDLE_PX * px);
      ink.fillStyle = palette.sheet;
      ink.fill();
      return strokeInk(ink, palette.petrol, 2 * px);
    }
    const arm = 7 * px;
    ink.beginPath();
    ink.moveTo(x - arm, y);
    ink.lineTo(x + arm, y);
    ink.moveTo(x, y - arm);
    ink.lineTo(x, y + arm);
    strokeInk(ink, palette.sheet, 4 * px);
    strokeInk(ink, palette.petrol, 2 * px);
  };
  return (
    <Shape
      name={`handle-${kind}`}
      x={item.xMm}
      y={item.yMm}
      rotation={item.angleDeg}
      listening={onPress !== undefined}
      sceneFunc={(context, shape) => drawKnob(inkOf(context), pixelOf(shape))}
      hitFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        traceCircle(ink, ...placeOf(px), (kind === 'rotate' ? 16 : 11) * px);
        ink.fillStyle = shape.colorKey;
        ink.fill();
      }}
      onPointerDown={(event: Konva.KonvaEventObject<PointerEvent>) => {
        const stage = event.target.getStage();
        const screen = stage?.getPointerPosition();
        const floor = stage?.getRelativePointerPosition();
        if (!screen || !floor) return;
        onPress?.(kind, { screen, floor: { xMm: floor.x, yMm: floor.y }, event: event.evt });
      }}
    />
  );
});
