/**
 * Which part of the floor a stage shows. Floor frame: mm, x right, y away. Screen frame: CSS pixels from the stage's upper
 * left corner, y down. Nothing here knows a canvas.
 */

export interface Viewport {
  /** Pixels per millimetre. */
  readonly scale: number;
  /** The floor point at the stage's upper left corner. */
  readonly xMm: number;
  readonly yMm: number;
}

export interface FloorPoint {
  readonly xMm: number;
  readonly yMm: number;
}

export interface ScreenPoint {
  readonly x: number;
  readonly y: number;
}

export interface FloorBounds {
  readonly minXMm: number;
  readonly minYMm: number;
  readonly maxXMm: number;
  readonly maxYMm: number;
}

/** A kilometre of hall fits a screen at the lower end; a millimetre is four pixels at the upper. */
export const MIN_SCALE = 0.001;
export const MAX_SCALE = 4;

/** CSS defines a pixel as 1/96 inch. */
const MM_PER_CSS_PX = 25.4 / 96;

export function floorToScreen(viewport: Viewport, point: FloorPoint): ScreenPoint {
  return { x: (point.xMm - viewport.xMm) * viewport.scale, y: (viewport.yMm - point.yMm) * viewport.scale };
}

export function screenToFloor(viewport: Viewport, point: ScreenPoint): FloorPoint {
  return { xMm: viewport.xMm + point.x / viewport.scale, yMm: viewport.yMm - point.y / viewport.scale };
}

/** Scales by `factor`, keeping the floor point under `at` where it is. The scale stays between MIN_SCALE and MAX_SCALE. */
export function zoomAt(viewport: Viewport, at: ScreenPoint, factor: number): Viewport {
  const scale = Math.min(MAX_SCALE, Math.max(MIN_SCALE, viewport.scale * factor));
  const fixed = screenToFloor(viewport, at);
  return { scale, xMm: fixed.xMm - at.x / scale, yMm: fixed.yMm + at.y / scale };
}

/** Moves the drawing with the pointer: by so many pixels right and down. */
export function panBy(viewport: Viewport, dx: number, dy: number): Viewport {
  return { ...viewport, xMm: viewport.xMm - dx / viewport.scale, yMm: viewport.yMm + dy / viewport.scale };
}

/** The viewport that shows the whole of `bounds` in the middle of a stage, with a margin on every side. Sizes in px. */
export function fitBounds(
  bounds: FloorBounds,
  size: { readonly width: number; readonly height: number },
  marginPx = 40,
): Viewport {
  const widthMm = Math.max(bounds.maxXMm - bounds.minXMm, 1);
  const heightMm = Math.max(bounds.maxYMm - bounds.minYMm, 1);
  const fitting = Math.min(
    Math.max(size.width - 2 * marginPx, 1) / widthMm,
    Math.max(size.height - 2 * marginPx, 1) / heightMm,
  );
  const scale = Math.min(MAX_SCALE, Math.max(MIN_SCALE, fitting));
  return {
    scale,
    xMm: (bounds.minXMm + bounds.maxXMm) / 2 - size.width / 2 / scale,
    yMm: (bounds.minYMm + bounds.maxYMm) / 2 + size.height / 2 / scale,
  };
}

/** The floor that a stage of this size shows. */
export function visibleBounds(
  viewport: Viewport,
  size: { readonly width: number; readonly height: number },
): FloorBounds {
  return {
    minXMm: viewport.xMm,
    maxXMm: viewport.xMm + size.width / viewport.scale,
    minYMm: viewport.yMm - size.height / viewport.scale,
    maxYMm: viewport.yMm,
  };
}

/** The n of a drawing scale 1 : n, rounded to two figures as a drawing office writes it. */
export function drawingRatio(viewport: Viewport): number {
  const ratio = 1 / (viewport.scale * MM_PER_CSS_PX);
  return Number(ratio.toPrecision(2));
}

/** The smallest bounds round both; null stands for nothing. */
export function unionBounds(first: FloorBounds | null, second: FloorBounds | null): FloorBounds | null {
  if (!first || !second) return first ?? second;
  return {
    minXMm: Math.min(first.minXMm, second.minXMm),
    minYMm: Math.min(first.minYMm, second.minYMm),
    maxXMm: Math.max(first.maxXMm, second.maxXMm),
    maxYMm: Math.max(first.maxYMm, second.maxYMm),
  };
}

/** The bounds of some floor points; null without any. */
export function boundsOfPoints(points: Iterable<readonly [number, number]>): FloorBounds | null {
  let bounds: FloorBounds | null = null;
  for (const [x, y] of points) bounds = unionBounds(bounds, { minXMm: x, minYMm: y, maxXMm: x, maxYMm: y });
  return bounds;
}
