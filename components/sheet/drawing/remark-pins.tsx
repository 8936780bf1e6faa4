'use client';

import { memo } from 'react';
import type Konva from 'konva';
import { Shape } from 'react-konva';
import { inkOf, pixelOf, strokeInk } from './ink';
import type { SheetPointer } from './types';
import { usePalette } from './use-palette';

export interface PinnedRemark {
  readonly id: string;
  readonly number: number;
  readonly xMm: number;
  readonly yMm: number;
  readonly resolved: boolean;
}

export interface RemarkPinsProps {
  readonly remarks: readonly PinnedRemark[];
  readonly chosenId?: string | null;
  readonly onPinPointerDown?: (remarkId: string, pointer: SheetPointer) => void;
}

const RADIUS_PX = 12;
const TIP_PX = 19;

/** Drop pins whose tip stands on the spot: ink, red when chosen, hollow once settled. Belongs inside an OverlayLayer. */
export function RemarkPins({ remarks, chosenId = null, onPinPointerDown }: RemarkPinsProps) {
  const ordered = [...remarks].sort((a, b) => Number(a.id === chosenId) - Number(b.id === chosenId));
  return ordered.map((remark) => (
    <Pin key={remark.id} remark={remark} chosen={remark.id === chosenId} onPinPointerDown={onPinPointerDown} />
  ));
}

interface PinProps extends Pick<RemarkPinsProps, 'onPinPointerDown'> {
  readonly remark: PinnedRemark;
  readonly chosen: boolean;
}

const Pin = memo(function Pin({ remark, chosen, onPinPointerDown }: PinProps) {
  const palette = usePalette();
  const colour = chosen ? palette.red : remark.resolved ? palette.inkSoft : palette.ink;
  const trace = (ink: CanvasRenderingContext2D, grow = 0) => {
    ink.beginPath();
    ink.arc(0, -TIP_PX, RADIUS_PX + grow, Math.PI * 0.85, Math.PI * 0.15);
    ink.lineTo(0, grow);
    ink.closePath();
  };
  return (
    <Shape
      x={remark.xMm}
      y={remark.yMm}
      listening={onPinPointerDown !== undefined}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        ink.scale(px, -px);
        trace(ink);
        ink.lineJoin = 'round';
        strokeInk(ink, palette.sheet, 3);
        ink.fillStyle = remark.resolved && !chosen ? palette.sheet : colour;
        ink.fill();
        if (remark.resolved && !chosen) strokeInk(ink, colour, 1.4);
        ink.fillStyle = remark.resolved && !chosen ? colour : palette.sheet;
        ink.font = `600 12px ${palette.mono}`;
        ink.textAlign = 'center';
        ink.textBaseline = 'middle';
        ink.fillText(String(remark.number), 0, -TIP_PX + 0.5);
      }}
      hitFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        ink.scale(px, -px);
        trace(ink, 4);
        ink.fillStyle = shape.colorKey;
        ink.fill();
      }}
      onPointerDown={(event: Konva.KonvaEventObject<PointerEvent>) => {
        const stage = event.target.getStage();
        const screen = stage?.getPointerPosition();
        const floor = stage?.getRelativePointerPosition();
        if (!screen || !floor) return;
        onPinPointerDown?.(remark.id, { screen, floor: { xMm: floor.x, yMm: floor.y }, event: event.evt });
      }}
    />
  );
});
