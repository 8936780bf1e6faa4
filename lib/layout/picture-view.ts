import { fitBounds, floorToScreen, screenToFloor, type ScreenPoint, type Viewport } from './viewport';

/**
 * The viewport of a picture that has no scale yet. A viewport counts millimetres with y away; here a quarter of a picture
 * pixel stands for one, which takes the closest zoom (MAX_SCALE) to 16 screen pixels a picture pixel. Picture frame: pixels,
 * x right, y down from the upper left corner.
 */
const UNITS_PER_PX = 4;

export type PicturePoint = [xPx: number, yPx: number];

export function pictureToScreen(viewport: Viewport, [xPx, yPx]: readonly [number, number]): ScreenPoint {
  return floorToScreen(viewport, { xMm: xPx * UNITS_PER_PX, yMm: -yPx * UNITS_PER_PX });
}

export function screenToPicture(viewport: Viewport, at: ScreenPoint): PicturePoint {
  const { xMm, yMm } = screenToFloor(viewport, at);
  return [xMm / UNITS_PER_PX, -yMm / UNITS_PER_PX];
}

/** Screen pixels a picture pixel. */
export const pictureZoom = (viewport: Viewport): number => viewport.scale * UNITS_PER_PX;

/** The whole picture in the middle of a stage; sizes in px. */
export function fitPicture(
  picture: { readonly widthPx: number; readonly heightPx: number },
  size: { readonly width: number; readonly height: number },
  marginPx = 24,
): Viewport {
  const bounds = {
    minXMm: 0,
    maxXMm: picture.widthPx * UNITS_PER_PX,
    minYMm: -picture.heightPx * UNITS_PER_PX,
    maxYMm: 0,
  };
  return fitBounds(bounds, size, marginPx);
}

/** The viewport that puts a picture point in the middle of the stage at the present zoom, or closer if asked. */
export function centrePicture(
  viewport: Viewport,
  [xPx, yPx]: readonly [number, number],
  size: { readonly width: number; readonly height: number },
): Viewport {
  return {
    scale: viewport.scale,
    xMm: xPx * UNITS_PER_PX - size.width / 2 / viewport.scale,
    yMm: -yPx * UNITS_PER_PX + size.height / 2 / viewport.scale,
  };
}
