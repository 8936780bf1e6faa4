'use client';

import { useMemo, useRef } from 'react';
import type { SheetPointer } from '@/components/sheet/drawing';
import type { Grip } from '@/lib/editor/grips';
import type { Press, Target } from '@/lib/editor/tools/tool';
import { useBoard } from './board-context';

/** A click may stray this far, px. */
const SLACK_PX = 4;
/** A finger strays farther. */
const FINGER_SLACK_PX = 9;

/** Hands the canvas's pointers to the tool that is in hand. */
export function useToolPointer() {
  const { sheet, view, presence } = useBoard();
  const down = useRef<{ target: Target | null } | null>(null);
  return useMemo(() => {
    const pressOf = ({ floor, event }: SheetPointer, target: Target | null): Press => ({
      xMm: floor.xMm,
      yMm: floor.yMm,
      target,
      shift: event.shiftKey,
      alt: event.altKey,
      slackMm: (event.pointerType === 'touch' ? FINGER_SLACK_PX : SLACK_PX) / view.get().viewport.scale,
    });
    const press = (pointer: SheetPointer, target: Target | null) => {
      if (pointer.event.button !== 0) return;
      down.current = { target };
      sheet.press(pressOf(pointer, target));
    };
    return {
      onFloor: (pointer: SheetPointer) => press(pointer, null),
      onItem: (itemId: string, pointer: SheetPointer) => press(pointer, { part: 'item', itemId }),
      onTaskPoint: (itemId: string, taskPointId: string, pointer: SheetPointer) =>
        press(pointer, { part: 'taskPoint', itemId, taskPointId }),
      onHandle: (handle: 'move' | 'rotate', pointer: SheetPointer) => {
        const [itemId] = sheet.getState().selection.itemIds;
        if (itemId) press(pointer, { part: handle === 'rotate' ? 'turn' : 'item', itemId });
      },
      onGrip: (itemId: string, grip: Grip, pointer: SheetPointer) => press(pointer, { part: 'grip', itemId, grip }),
      onMove: (pointer: SheetPointer) => {
        presence.pointAt({ xMm: Math.round(pointer.floor.xMm), yMm: Math.round(pointer.floor.yMm) });
        sheet.move(pressOf(pointer, null));
      },
      onUp: (pointer: SheetPointer) => {
        if (!down.current) return;
        // What was pressed stays the target to the end, so that a click means the same when pressed and when let go.
        const { target } = down.current;
        down.current = null;
        sheet.release(pressOf(pointer, target));
      },
      onTakenAway: () => {
        down.current = null;
        sheet.interrupt();
      },
      onLeave: () => {
        presence.pointAt(null);
        // A ghost that follows the pointer has nothing to follow; a gesture in hand goes on outside.
        if (!down.current && sheet.getState().draft) sheet.use(sheet.getState().tool);
      },
      onFinish: () => sheet.finish(),
    };
  }, [sheet, view, presence]);
}
