import type { Calibration, CalibrationRequest } from './calibration';

interface Picture {
  readonly widthPx: number;
  readonly heightPx: number;
}

/** Pictures of one hall whose shapes differ by no more than this are taken for the same sheet, scanned or printed anew. */
const SAME_SHAPE = 0.005;

type Point = readonly [number, number];

/**
 * The scale, origin and level line of a floor plan for a newer picture of the same sheet, which may have more or fewer pixels. Null
 * where the pictures have different shapes: then the newer one shows another part of the floor and must be set to scale by itself.
 */
export function carriedCalibration(known: Calibration, from: Picture, to: Picture): CalibrationRequest | null {
  const byX = to.widthPx / from.widthPx;
  const byY = to.heightPx / from.heightPx;
  if (Math.abs(byX / byY - 1) > SAME_SHAPE) return null;
  const carry = ([x, y]: Point): [number, number] => [x * byX, y * byY];
  const line = <Line extends { readonly fromPx: Point; readonly toPx: Point }>(given: Line) => ({
    ...given,
    fromPx: carry(given.fromPx),
    toPx: carry(given.toPx),
  });
  return {
    scale: line(known.scale),
    check: known.check && line(known.check),
    level: known.level && line(known.level),
    originPx: carry(known.originPx),
  };
}
