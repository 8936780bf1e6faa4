'use client';

import { Maximize, Minus, Plus } from 'lucide-react';
import { useRef, useState, type KeyboardEvent } from 'react';
import { usePanAndZoom } from '@/components/sheet/drawing/use-pan-and-zoom';
import { usePicture } from '@/components/sheet/drawing/use-picture';
import { Button } from '@/components/ui/button';
import type { Size } from '@/components/ui/use-size';
import { pictureUrl } from '@/lib/client/use-floor-plans';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import { pointOf } from '@/lib/layout/calibration-draft';
import {
  fitPicture,
  pictureToScreen,
  pictureZoom,
  screenToPicture,
  type PicturePoint,
} from '@/lib/layout/picture-view';
import { zoomAt, type ScreenPoint, type Viewport } from '@/lib/layout/viewport';
import { CalibrationDrawing } from './calibration-drawing';
import { grabbedHandle } from './grabbed-handle';
import { Loupe } from './loupe';
import { HANDLE_WORDS } from './step-words';
import type { CalibrationInHand } from './use-calibration';
import { usePointing } from './use-pointing';

interface CalibrationStageProps {
  floorPlan: FloorPlan;
  calibration: CalibrationInHand;
  size: Size;
}

const ZOOM_STEP = 1.5;
const NUDGES: Record<string, PicturePoint> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

/** The picture with its points: wheel and pinch zoom, drag pans, a click places the selected point, arrow keys move it. */
export function CalibrationStage({ floorPlan, calibration, size }: CalibrationStageProps) {
  const { draft, selected, isPicking, deeds } = calibration;
  const [asked, setAsked] = useState<Viewport | null>(null);
  const viewport = asked ?? fitPicture(floorPlan, size);
  const zoom = pictureZoom(viewport);
  const middle = { x: size.width / 2, y: size.height / 2 };
  const container = useRef<HTMLDivElement>(null);
  const picture = usePicture(pictureUrl(floorPlan.id, useWantedWidth(floorPlan, zoom)));

  const panAndZoom = usePanAndZoom({
    container,
    viewport,
    onViewportChange: setAsked,
    dragPans: true,
    hits: (at: ScreenPoint) => grabbedHandle(calibration, viewport, at) !== null,
    onPanTakesOver: () => undefined,
  });
  const pointing = usePointing({ container, viewport, calibration, gesture: panAndZoom.gesture });

  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.target !== event.currentTarget || event.altKey || event.ctrlKey || event.metaKey) return;
    const point = selected && pointOf(draft, selected);
    const nudge = NUDGES[event.key];
    if (nudge && selected && point) {
      const step = event.shiftKey ? 10 : 1;
      deeds.move(selected, [point[0] + nudge[0] * step, point[1] + nudge[1] * step]);
    } else if (event.key === 'Enter' && isPicking) deeds.place(screenToPicture(viewport, middle));
    else if (event.key === 'Escape') deeds.select(null);
    else if (event.key === '+' || event.key === '=') setAsked(zoomAt(viewport, middle, ZOOM_STEP));
    else if (event.key === '-') setAsked(zoomAt(viewport, middle, 1 / ZOOM_STEP));
    else if (event.key === '0') setAsked(null);
    else return;
    event.preventDefault();
  };

  const aim = pointing.aim;
  const origin = pictureToScreen(viewport, [0, 0]);
  return (
    <div className="relative h-full overflow-hidden bg-paper">
      <div
        ref={container}
        role="application"
        aria-roledescription="picture"
        aria-label={`${floorPlan.name}. ${selected ? `${HANDLE_WORDS[selected]} is selected.` : 'No point is selected.'} Enter places it in the middle, arrow keys move it by one pixel, with Shift by ten.`}
        tabIndex={0}
        data-testid="calibration-picture"
        data-picture-left={origin.x}
        data-picture-top={origin.y}
        data-picture-zoom={zoom}
        data-picture-shown={picture !== null}
        className="absolute inset-0 touch-none select-none focus-visible:-outline-offset-2"
        style={{
          cursor: pointing.isDragging
            ? 'none'
            : isPicking
              ? 'crosshair'
              : aim?.handle
                ? 'move'
                : panAndZoom.hand === 'closed'
                  ? 'grabbing'
                  : 'grab',
        }}
        onKeyDown={onKeyDown}
        onPointerDownCapture={panAndZoom.handlers.onPointerDownCapture}
        onPointerMoveCapture={panAndZoom.handlers.onPointerMoveCapture}
        {...pointing.handlers}
        onPointerUpCapture={(event) => {
          pointing.onPointerUp(event);
          panAndZoom.handlers.onPointerEndCapture(event);
        }}
        onPointerCancelCapture={(event) => {
          pointing.onPointerCancel();
          panAndZoom.handlers.onPointerEndCapture(event);
        }}
      >
        <CalibrationDrawing
          floorPlan={floorPlan}
          picture={picture}
          calibration={calibration}
          viewport={viewport}
          size={size}
        />
      </div>
      {picture && aim && (isPicking || pointing.isDragging) && (
        <Loupe
          picture={picture}
          widthPx={floorPlan.widthPx}
          point={aim.point}
          onRight={aim.screen.x < size.width / 2 || aim.screen.y > 220}
        />
      )}
      <div className="absolute right-3 bottom-3 flex items-stretch border border-rule bg-sheet">
        <Button
          variant="quiet"
          size="icon"
          aria-label="Zoom out"
          onClick={() => setAsked(zoomAt(viewport, middle, 1 / ZOOM_STEP))}
        >
          <Minus aria-hidden className="size-4" />
        </Button>
        <span className="flex min-w-16 items-center justify-center border-x border-rule px-2 font-mono text-sm">
          {Math.round(zoom * 100)}%
        </span>
        <Button
          variant="quiet"
          size="icon"
          aria-label="Zoom in"
          onClick={() => setAsked(zoomAt(viewport, middle, ZOOM_STEP))}
        >
          <Plus aria-hidden className="size-4" />
        </Button>
        <Button
          variant="quiet"
          size="icon"
          aria-label="Show the whole picture"
          className="border-l-rule"
          onClick={() => setAsked(null)}
        >
          <Maximize aria-hidden className="size-4" />
        </Button>
      </div>
    </div>
  );
}

/** The picture's width worth loading: what the screen can show, growing with the zoom and never shrinking again. */
function useWantedWidth(floorPlan: FloorPlan, zoom: number): number {
  const [loaded, setLoaded] = useState(0);
  const density = typeof window === 'undefined' ? 1 : window.devicePixelRatio;
  const shown = Math.min(floorPlan.widthPx, floorPlan.widthPx * zoom * density);
  const wanted =
    floorPlan.pictureWidths.find((width) => width >= shown) ?? floorPlan.pictureWidths.at(-1) ?? floorPlan.widthPx;
  if (wanted > loaded) setLoaded(wanted);
  return Math.max(loaded, wanted);
}
