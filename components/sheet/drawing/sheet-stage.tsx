'use client';

import { useCallback, useEffect, useMemo, useRef, type KeyboardEvent, type PointerEvent, type ReactNode } from 'react';
import type Konva from 'konva';
import { Stage } from 'react-konva';
import { panBy, screenToFloor, zoomAt, type ScreenPoint, type Viewport } from '@/lib/layout/viewport';
import type { SheetPointer } from './types';
import { useFontsReady } from './use-fonts-ready';
import { usePanAndZoom } from './use-pan-and-zoom';
import { StageFrameProvider } from './viewport-context';

export interface SheetStageProps {
  readonly width: number;
  readonly height: number;
  readonly viewport: Viewport;
  readonly onViewportChange: (viewport: Viewport) => void;
  /** What a screen reader says the drawing is; the list of items is the full route. */
  readonly label: string;
  /** Reader's sheets: the main button drags the floor and arrow keys move it. */
  readonly dragPans?: boolean;
  /** A press on bare floor (never one on a listening item, nor one that pans). */
  readonly onFloorPointerDown?: (pointer: SheetPointer) => void;
  /** Press and let go on bare floor without moving. */
  readonly onFloorTap?: (pointer: SheetPointer) => void;
  /** Every move and end that is not a pan, wherever it began; drags go on outside the stage. */
  readonly onPointerMove?: (pointer: SheetPointer) => void;
  readonly onPointerUp?: (pointer: SheetPointer) => void;
  /** The gesture was taken away (a pan, a pinch, the system): go back to before it. */
  readonly onPointerCancel?: (pointer: SheetPointer) => void;
  readonly onPointerLeave?: () => void;
  readonly onDoubleClick?: (pointer: SheetPointer) => void;
  readonly cursor?: string;
  readonly children: ReactNode;
}

const TAP_SLACK_PX = 5;
const KEY_PAN_PX = 60;
const KEY_ZOOM = 1.25;

/** The canvas: floor millimetres with y away, whatever the zoom. Its children are layers (GroundLayer, ItemsLayer, OverlayLayer). */
export function SheetStage(props: SheetStageProps) {
  const { width, height, viewport, onViewportChange, dragPans = false } = props;
  const container = useRef<HTMLDivElement>(null);
  const stage = useRef<Konva.Stage>(null);
  const pressedAt = useRef<ScreenPoint>({ x: 0, y: 0 });
  const latest = useRef(props);
  useEffect(() => {
    latest.current = props;
  });
  useFontsReady(useCallback(() => stage.current?.batchDraw(), []));

  const pointerOf = useCallback((event: globalThis.PointerEvent | globalThis.MouseEvent): SheetPointer => {
    const box = container.current?.getBoundingClientRect();
    const screen = { x: event.clientX - (box?.left ?? 0), y: event.clientY - (box?.top ?? 0) };
    return { screen, floor: screenToFloor(latest.current.viewport, screen), event: event as globalThis.PointerEvent };
  }, []);

  const { handlers, hand, gesture } = usePanAndZoom({
    container,
    viewport,
    onViewportChange,
    dragPans,
    hits: (at) => Boolean(stage.current?.getIntersection(at)),
    onPanTakesOver: (event) => latest.current.onPointerCancel?.(pointerOf(event)),
  });

  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>) => {
    if (event.target !== event.currentTarget || event.altKey || event.ctrlKey || event.metaKey) return;
    const middle = { x: width / 2, y: height / 2 };
    const moves: Record<string, () => Viewport> = {
      '+': () => zoomAt(viewport, middle, KEY_ZOOM),
      '=': () => zoomAt(viewport, middle, KEY_ZOOM),
      '-': () => zoomAt(viewport, middle, 1 / KEY_ZOOM),
      ...(dragPans && {
        ArrowLeft: () => panBy(viewport, KEY_PAN_PX, 0),
        ArrowRight: () => panBy(viewport, -KEY_PAN_PX, 0),
        ArrowUp: () => panBy(viewport, 0, KEY_PAN_PX),
        ArrowDown: () => panBy(viewport, 0, -KEY_PAN_PX),
      }),
    };
    const move = moves[event.key];
    if (!move) return;
    event.preventDefault();
    onViewportChange(move());
  };

  const frame = useMemo(() => ({ viewport, width, height }), [viewport, width, height]);
  const cursor =
    hand === 'none' ? (props.cursor ?? (dragPans ? 'grab' : 'default')) : hand === 'open' ? 'grab' : 'grabbing';

  return (
    <div
      ref={container}
      role="application"
      aria-roledescription="drawing"
      aria-label={props.label}
      tabIndex={0}
      className="relative select-none overflow-hidden bg-sheet outline-offset-[-2px]"
      style={{ width, height, cursor, touchAction: 'none' }}
      onKeyDown={onKeyDown}
      onPointerDownCapture={handlers.onPointerDownCapture}
      onPointerDown={(event: PointerEvent<HTMLDivElement>) => {
        // The pointer stays with the stage until it is let go, so a drag that leaves the canvas is still heard.
        event.currentTarget.setPointerCapture(event.pointerId);
        const pointer = pointerOf(event.nativeEvent);
        pressedAt.current = pointer.screen;
        if (gesture.current !== 'item') props.onFloorPointerDown?.(pointer);
      }}
      onPointerMoveCapture={handlers.onPointerMoveCapture}
      onPointerMove={(event) => {
        if (gesture.current !== 'pan' && gesture.current !== 'pinch')
          props.onPointerMove?.(pointerOf(event.nativeEvent));
      }}
      onPointerUpCapture={(event) => {
        const during = gesture.current;
        handlers.onPointerEndCapture(event);
        if (during === 'pan' || during === 'pinch') return;
        const pointer = pointerOf(event.nativeEvent);
        props.onPointerUp?.(pointer);
        if (during === 'item' || event.button !== 0) return;
        const strayed = Math.hypot(pointer.screen.x - pressedAt.current.x, pointer.screen.y - pressedAt.current.y);
        if (strayed <= TAP_SLACK_PX) props.onFloorTap?.(pointer);
      }}
      onPointerCancelCapture={(event) => {
        handlers.onPointerEndCapture(event);
        props.onPointerCancel?.(pointerOf(event.nativeEvent));
      }}
      onPointerLeave={props.onPointerLeave}
      onDoubleClick={(event) => props.onDoubleClick?.(pointerOf(event.nativeEvent))}
    >
      <Stage
        ref={stage}
        width={width}
        height={height}
        x={-viewport.xMm * viewport.scale}
        y={viewport.yMm * viewport.scale}
        scaleX={viewport.scale}
        scaleY={-viewport.scale}
      >
        <StageFrameProvider value={frame}>{props.children}</StageFrameProvider>
      </Stage>
    </div>
  );
}
