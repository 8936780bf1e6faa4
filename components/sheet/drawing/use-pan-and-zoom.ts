'use client';

import { useEffect, useMemo, useRef, useState, type PointerEvent as ReactPointerEvent, type RefObject } from 'react';
import { panBy, zoomAt, type ScreenPoint, type Viewport } from '@/lib/layout/viewport';

export interface PanAndZoomOptions {
  readonly container: RefObject<HTMLDivElement | null>;
  readonly viewport: Viewport;
  readonly onViewportChange: (viewport: Viewport) => void;
  /** True where the main button drags the floor too (a reader's sheet); otherwise it takes space, the middle button or a finger. */
  readonly dragPans: boolean;
  /** Whether something that listens lies under this point; such a press belongs to the item and never pans. */
  readonly hits: (at: ScreenPoint) => boolean;
  /** A press on the floor that had been handed on turned into a pan: whoever started something with it should drop it. */
  readonly onPanTakesOver: (event: PointerEvent) => void;
}

/** How far a finger or mouse may stray and still be a tap, px. */
const TAP_SLACK_PX = 5;
const WHEEL_RATE = 0.0015;
const PINCH_WHEEL_RATE = 0.01;
const LINE_HEIGHT_PX = 16;

type Gesture = 'idle' | 'item' | 'waiting' | 'pan' | 'pinch' | 'plain';

interface Held extends ScreenPoint {
  readonly startX: number;
  readonly startY: number;
}

function placeOf(container: HTMLElement, event: { clientX: number; clientY: number }): ScreenPoint {
  const box = container.getBoundingClientRect();
  return { x: event.clientX - box.left, y: event.clientY - box.top };
}

function isTyping(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && target.closest('input, textarea, select, button, [contenteditable]') !== null;
}

/** Wheel, pinch, space, middle-button and finger gestures on the stage; one gesture at a time, and none while an item is held. */
export function usePanAndZoom(options: PanAndZoomOptions) {
  const latest = useRef(options);
  useEffect(() => {
    latest.current = options;
  });
  const gesture = useRef<Gesture>('idle');
  const held = useRef(new Map<number, Held>());
  const spaceDown = useRef(false);
  const [hand, setHand] = useState<'none' | 'open' | 'closed'>('none');

  useEffect(() => {
    const container = options.container.current;
    if (!container) return;
    const onWheel = (event: WheelEvent) => {
      event.preventDefault();
      if (gesture.current === 'item') return;
      const pixels = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? event.deltaY * LINE_HEIGHT_PX : event.deltaY;
      const factor = Math.exp(-pixels * (event.ctrlKey ? PINCH_WHEEL_RATE : WHEEL_RATE));
      latest.current.onViewportChange(zoomAt(latest.current.viewport, placeOf(container, event), factor));
    };
    // React listens passively to the wheel, and a passive listener cannot keep the page from scrolling.
    container.addEventListener('wheel', onWheel, { passive: false });
    return () => container.removeEventListener('wheel', onWheel);
  }, [options.container]);

  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.code !== 'Space' || isTyping(event.target)) return;
      const down = event.type === 'keydown';
      if (down && event.target === options.container.current) event.preventDefault();
      if (spaceDown.current === down) return;
      spaceDown.current = down;
      if (gesture.current === 'idle') setHand(down ? 'open' : 'none');
    };
    const letGo = () => {
      spaceDown.current = false;
      setHand('none');
    };
    window.addEventListener('keydown', onKey);
    window.addEventListener('keyup', onKey);
    window.addEventListener('blur', letGo);
    return () => {
      window.removeEventListener('keydown', onKey);
      window.removeEventListener('keyup', onKey);
      window.removeEventListener('blur', letGo);
    };
  }, [options.container]);

  const handlers = useMemo(() => {
    const settle = () => {
      gesture.current = 'idle';
      setHand(spaceDown.current ? 'open' : 'none');
    };
    return {
      /** Runs before the canvas hears of the press; a press that pans is kept from it. */
      onPointerDownCapture(event: ReactPointerEvent<HTMLDivElement>) {
        const at = placeOf(event.currentTarget, event);
        held.current.set(event.pointerId, { ...at, startX: at.x, startY: at.y });
        if (gesture.current === 'item') return event.stopPropagation();
        if (held.current.size === 2 && event.pointerType === 'touch') {
          if (gesture.current === 'waiting') latest.current.onPanTakesOver(event.nativeEvent);
          gesture.current = 'pinch';
          return event.stopPropagation();
        }
        if (held.current.size > 1) return event.stopPropagation();
        if (event.button === 1 || (event.button === 0 && spaceDown.current)) {
          event.preventDefault();
          gesture.current = 'pan';
          setHand('closed');
          return event.stopPropagation();
        }
        if (event.button !== 0) {
          gesture.current = 'plain';
        } else if (latest.current.hits(at)) {
          gesture.current = 'item';
        } else {
          gesture.current = latest.current.dragPans || event.pointerType === 'touch' ? 'waiting' : 'plain';
        }
      },
      onPointerMoveCapture(event: ReactPointerEvent<HTMLDivElement>) {
        const before = held.current.get(event.pointerId);
        if (!before) return;
        const at = placeOf(event.currentTarget, event);
        const { viewport, onViewportChange, onPanTakesOver } = latest.current;
        if (gesture.current === 'waiting') {
          if (Math.hypot(at.x - before.startX, at.y - before.startY) <= TAP_SLACK_PX) return;
          gesture.current = 'pan';
          setHand('closed');
          onPanTakesOver(event.nativeEvent);
        }
        if (gesture.current === 'pan') {
          onViewportChange(panBy(viewport, at.x - before.x, at.y - before.y));
        } else if (gesture.current === 'pinch') {
          const other = [...held.current].find(([id]) => id !== event.pointerId)?.[1];
          if (other) {
            const spread = Math.hypot(before.x - other.x, before.y - other.y);
            const factor = spread > 1 ? Math.hypot(at.x - other.x, at.y - other.y) / spread : 1;
            const middle = { x: (at.x + other.x) / 2, y: (at.y + other.y) / 2 };
            const moved = panBy(viewport, (at.x - before.x) / 2, (at.y - before.y) / 2);
            onViewportChange(zoomAt(moved, middle, factor));
          }
        }
        held.current.set(event.pointerId, { ...before, x: at.x, y: at.y });
      },
      onPointerEndCapture(event: ReactPointerEvent<HTMLDivElement>) {
        held.current.delete(event.pointerId);
        if (held.current.size === 0) settle();
        // The finger that stays after a pinch goes on panning rather than jumping.
        else if (gesture.current === 'pinch') gesture.current = 'pan';
      },
    };
  }, []);

  return { handlers, hand, gesture };
}
