'use client';

import { useRef, useState, type PointerEvent, type RefObject } from 'react';
import { pointOf, type Handle } from '@/lib/layout/calibration-draft';
import { pictureToScreen, screenToPicture, type PicturePoint } from '@/lib/layout/picture-view';
import type { ScreenPoint, Viewport } from '@/lib/layout/viewport';
import { grabbedHandle } from './grabbed-handle';
import type { CalibrationInHand } from './use-calibration';

interface PointingOptions {
  container: RefObject<HTMLDivElement | null>;
  viewport: Viewport;
  calibration: CalibrationInHand;
  gesture: RefObject<string>;
}

interface Aim {
  screen: ScreenPoint;
  /** The picture point aimed at: under the pointer, or the point being dragged. */
  point: PicturePoint;
  handle: Handle | null;
}

interface Drag {
  handle: Handle;
  /** From the press to the point: the point does not jump under the finger. */
  offset: ScreenPoint;
  start: PicturePoint;
  /** False while the press may still turn out to be a click that places another point on the same spot. */
  holds: boolean;
}

const TAP_SLACK_PX = 5;

const isTap = (from: ScreenPoint | null, to: ScreenPoint): boolean =>
  from !== null && Math.hypot(to.x - from.x, to.y - from.y) <= TAP_SLACK_PX;

/** Placing the selected point by a click and dragging points that are there. */
export function usePointing({ container, viewport, calibration, gesture }: PointingOptions) {
  const { draft, isPicking, deeds } = calibration;
  const [aim, setAim] = useState<Aim | null>(null);
  const [drag, setDrag] = useState<Drag | null>(null);
  const pressedAt = useRef<ScreenPoint | null>(null);

  const placeOf = (event: PointerEvent): ScreenPoint => {
    const box = container.current?.getBoundingClientRect();
    return { x: event.clientX - (box?.left ?? 0), y: event.clientY - (box?.top ?? 0) };
  };

  return {
    aim,
    isDragging: drag?.holds ?? false,
    handlers: {
      onPointerDown(event: PointerEvent<HTMLDivElement>) {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        const at = placeOf(event);
        pressedAt.current = at;
        const handle = grabbedHandle(calibration, viewport, at);
        const start = handle && pointOf(draft, handle);
        if (!handle || !start) return;
        const there = pictureToScreen(viewport, start);
        if (!isPicking) {
          deeds.select(handle);
          setAim({ screen: at, point: start, handle });
        }
        setDrag({ handle, offset: { x: there.x - at.x, y: there.y - at.y }, start, holds: !isPicking });
      },
      onPointerMove(event: PointerEvent<HTMLDivElement>) {
        const at = placeOf(event);
        if (drag && (drag.holds || !isTap(pressedAt.current, at))) {
          if (!drag.holds) setDrag({ ...drag, holds: true });
          const point = screenToPicture(viewport, { x: at.x + drag.offset.x, y: at.y + drag.offset.y });
          deeds.move(drag.handle, point);
          setAim({ screen: at, point, handle: drag.handle });
          return;
        }
        if (gesture.current === 'pan' || gesture.current === 'pinch') pressedAt.current = null;
        setAim({ screen: at, point: screenToPicture(viewport, at), handle: grabbedHandle(calibration, viewport, at) });
      },
      onPointerLeave: () => setAim(null),
    },
    onPointerUp(event: PointerEvent<HTMLDivElement>) {
      const at = placeOf(event);
      const from = pressedAt.current;
      pressedAt.current = null;
      setDrag(null);
      if (!drag?.holds && isPicking && event.button === 0 && isTap(from, at))
        deeds.place(screenToPicture(viewport, at));
      if (event.pointerType === 'touch') setAim(null);
    },
    onPointerCancel() {
      if (drag?.holds) deeds.move(drag.handle, drag.start);
      pressedAt.current = null;
      setDrag(null);
      setAim(null);
    },
  };
}
