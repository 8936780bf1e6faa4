'use client';

import { memo } from 'react';
import type Konva from 'konva';
import { Shape } from 'react-konva';
import { gripsOf, pointOf, ROLL_PX, type Grip, type PlacedGrip } from '@/lib/editor/grips';
import type { Item } from '@/lib/layout/items';
import type { Palette } from '@/lib/layout/palette';
import { inkOf, pixelOf, strokeInk, traceCircle, type Ink } from './ink';
import type { SheetPointer } from './types';
import { usePalette } from './use-palette';

interface ShapeGripsProps {
  /** The chosen items as they are drawn. Grips appear where exactly one is chosen and it is not locked. */
  readonly items: readonly Item[];
  readonly chosenPointId: string | null;
  readonly onGripPointerDown: (itemId: string, grip: Grip, pointer: SheetPointer) => void;
}

const CORNER_PX = 4;
const SIDE_PX = 3;
const KNOB_PX = 5.5;
/** How near a press must come, px. */
const REACH_PX = 10;

/** Corners, sides and ends of the chosen item, and the knobs of its chosen task point. Inside an OverlayLayer. */
export const ShapeGrips = memo(function ShapeGrips({ items, chosenPointId, onGripPointerDown }: ShapeGripsProps) {
  const palette = usePalette();
  const item = items.length === 1 && !items[0].locked ? items[0] : null;
  if (!item) return null;
  const placed = (node: Konva.Node) => gripsOf(item, chosenPointId, pixelOf(node));
  const onPointerDown = (event: Konva.KonvaEventObject<PointerEvent>) => {
    const stage = event.target.getStage();
    const screen = stage?.getPointerPosition();
    const floor = stage?.getRelativePointerPosition();
    const local = event.target.getRelativePointerPosition();
    if (!screen || !floor || !local) return;
    const nearest = nearestGrip(placed(event.target), local.x, local.y);
    if (nearest)
      onGripPointerDown(item.id, nearest, { screen, floor: { xMm: floor.x, yMm: floor.y }, event: event.evt });
  };
  return (
    <Shape
      name="shape-grips"
      x={item.xMm}
      y={item.yMm}
      rotation={item.angleDeg}
      sceneFunc={(context, shape) => drawGrips(inkOf(context), palette, pixelOf(shape), item, placed(shape))}
      hitFunc={(context, shape) => {
        const ink = inkOf(context);
        ink.fillStyle = shape.colorKey;
        for (const { atMm } of placed(shape)) {
          traceCircle(ink, atMm[0], atMm[1], REACH_PX * pixelOf(shape));
          ink.fill();
        }
      }}
      onPointerDown={onPointerDown}
    />
  );
});

/** Corners go before the sides between them where both are within reach. */
function nearestGrip(placed: readonly PlacedGrip[], x: number, y: number): Grip | null {
  const distance = ({ atMm, grip }: PlacedGrip) =>
    Math.hypot(atMm[0] - x, atMm[1] - y) * (grip.kind === 'side' ? 1.5 : 1);
  const sorted = [...placed].sort((one, other) => distance(one) - distance(other));
  return sorted[0]?.grip ?? null;
}

function drawGrips(ink: Ink, palette: Palette, px: number, item: Item, placed: readonly PlacedGrip[]): void {
  for (const { grip, atMm } of placed) {
    const [x, y] = atMm;
    ink.fillStyle = palette.sheet;
    switch (grip.kind) {
      case 'corner':
        ink.beginPath();
        ink.rect(x - CORNER_PX * px, y - CORNER_PX * px, 2 * CORNER_PX * px, 2 * CORNER_PX * px);
        ink.fill();
        strokeInk(ink, palette.petrol, 1.6 * px);
        break;
      case 'side':
        traceCircle(ink, x, y, SIDE_PX * px);
        ink.fill();
        strokeInk(ink, palette.petrol, px);
        break;
      case 'end':
      case 'offset':
        traceCircle(ink, x, y, KNOB_PX * px);
        ink.fill();
        strokeInk(ink, palette.petrol, 1.8 * px);
        break;
      case 'aim':
      case 'roll':
        drawKnob(ink, palette, px, item, grip, atMm);
    }
  }
}

/** The aim stands off its point along a line, the roll rides on a ring round it. */
function drawKnob(
  ink: Ink,
  palette: Palette,
  px: number,
  item: Item,
  grip: Extract<Grip, { kind: 'aim' | 'roll' }>,
  [x, y]: readonly [number, number],
): void {
  const point = item.kind === 'fixture' ? pointOf(item, grip.taskPointId) : undefined;
  if (!point) return;
  if (grip.kind === 'roll') {
    traceCircle(ink, point.xMm, point.yMm, ROLL_PX * px);
    ink.setLineDash([2 * px, 3 * px]);
    strokeInk(ink, palette.petrol, px);
    ink.setLineDash([]);
  } else {
    ink.beginPath();
    ink.moveTo(point.xMm, point.yMm);
    ink.lineTo(x, y);
    strokeInk(ink, palette.petrol, 1.5 * px);
  }
  traceCircle(ink, x, y, (grip.kind === 'aim' ? KNOB_PX : KNOB_PX - 1.5) * px);
  ink.fillStyle = grip.kind === 'aim' ? palette.petrol : palette.sheet;
  ink.fill();
  strokeInk(ink, palette.petrol, 1.8 * px);
}
