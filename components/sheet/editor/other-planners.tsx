'use client';

import { Shape } from 'react-konva';
import { usePalette } from '@/components/sheet/drawing';
import { inkOf, letter, pixelOf, strokeInk, tracePath, type Ink } from '@/components/sheet/drawing/ink';
import { useOthers } from '@/lib/client/use-others';
import type { OtherPlanner } from '@/lib/contracts/presence';
import { boxOf } from '@/lib/editor/snap-lines';
import type { Item } from '@/lib/layout/items';
import type { Palette } from '@/lib/layout/palette';
import { useBoard, useBoardSheet } from './board-context';

/** Where the other planners point, and what they have chosen: ink, since colour belongs to the map. */
export function OtherPlanners() {
  const others = useOthers(useBoard());
  const items = useBoardSheet((state) => state.items);
  const palette = usePalette();
  if (others.length === 0) return null;
  return (
    <Shape
      listening={false}
      sceneFunc={(context, shape) => {
        const ink = inkOf(context);
        const px = pixelOf(shape);
        for (const other of others) {
          const held = other.itemIds.map((id) => items.get(id)).filter((item): item is Item => item !== undefined);
          for (const item of held) drawHeld(ink, palette, px, item);
          drawCursor(ink, palette, px, other);
        }
      }}
    />
  );
}

const GAP_PX = 9;

function drawHeld(ink: Ink, palette: Palette, px: number, item: Item): void {
  const box = boxOf([item]);
  if (!box || item.hidden) return;
  const gap = GAP_PX * px;
  ink.beginPath();
  ink.rect(box.minXMm - gap, box.minYMm - gap, box.maxXMm - box.minXMm + 2 * gap, box.maxYMm - box.minYMm + 2 * gap);
  ink.setLineDash([3 * px, 3 * px]);
  strokeInk(ink, palette.ink, px);
  ink.setLineDash([]);
}

function drawCursor(ink: Ink, palette: Palette, px: number, { at, name }: OtherPlanner): void {
  if (!at) return;
  const { xMm, yMm } = at;
  const arrow = [
    [0, 0],
    [0, -15],
    [4, -11.5],
    [10.5, -11.5],
  ] as const;
  tracePath(
    ink,
    arrow.map(([x, y]) => [xMm + x * px, yMm + y * px]),
    true,
  );
  strokeInk(ink, palette.sheet, 3 * px);
  ink.fillStyle = palette.ink;
  ink.fill();
  letter(ink, palette, px, { text: name, xMm, yMm, offsetPx: [12, 20], align: 'left', colour: palette.ink });
}
