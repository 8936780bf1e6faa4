import type { FloorBounds } from '@/lib/layout/viewport';
import type { ReportOptions } from '@/lib/contracts/reports';
import type { XY } from './pen/pen';

/** Sheets of paper, landscape (ISO 216), and the scale of a drawing on them. Points are 1/72 inch. */

export const PT_PER_MM = 72 / 25.4;
export const pt = (mm: number): number => mm * PT_PER_MM;

export interface Paper {
  readonly widthPt: number;
  readonly heightPt: number;
  readonly marginPt: number;
}

const SIZES_MM = { A4: [297, 210], A3: [420, 297] } as const;

export function paperOf(name: ReportOptions['paper']): Paper {
  const [width, height] = SIZES_MM[name];
  return { widthPt: pt(width), heightPt: pt(height), marginPt: pt(8) };
}

export interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Scales in use for drawings (ISO 5455 and its neighbours; common practice). */
const USUAL_SCALES = [5, 10, 20, 25, 50, 75, 100, 125, 150, 200, 250, 300, 400, 500, 750, 1000, 2000, 5000, 10_000];

/** The largest usual scale at which the floor fits the box, as the number behind 1:. */
export function fittingScale(bounds: FloorBounds, box: Box): number {
  const [widthMm, heightMm] = [box.width / PT_PER_MM, box.height / PT_PER_MM];
  const least = Math.max((bounds.maxXMm - bounds.minXMm) / widthMm, (bounds.maxYMm - bounds.minYMm) / heightMm);
  return USUAL_SCALES.find((scale) => scale >= least - 1e-9) ?? Math.ceil(least);
}

/** Where the floor lies on the page: `bounds` in the middle of the box. */
export interface PlanFrame {
  readonly scale: number;
  readonly box: Box;
  readonly ptPerMm: number;
  readonly toPage: (point: XY) => XY;
}

export function planFrame(bounds: FloorBounds, box: Box, scale: number): PlanFrame {
  const ptPerMm = PT_PER_MM / scale;
  const middle: XY = [(bounds.minXMm + bounds.maxXMm) / 2, (bounds.minYMm + bounds.maxYMm) / 2];
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
  return {
    scale,
    box,
    ptPerMm,
    toPage: ([xMm, yMm]) => [x + (xMm - middle[0]) * ptPerMm, y - (yMm - middle[1]) * ptPerMm],
  };
}

/** Parts of the floor that fill a page each at this scale, left to right and top to bottom. */
export function pageBounds(bounds: FloorBounds, box: Box, scale: number): FloorBounds[] {
  const [widthMm, heightMm] = [(box.width / PT_PER_MM) * scale, (box.height / PT_PER_MM) * scale];
  const columns = Math.max(1, Math.ceil((bounds.maxXMm - bounds.minXMm) / widthMm - 1e-9));
  const rows = Math.max(1, Math.ceil((bounds.maxYMm - bounds.minYMm) / heightMm - 1e-9));
  if (columns * rows === 1) return [bounds];
  const left = (bounds.minXMm + bounds.maxXMm - columns * widthMm) / 2;
  const top = (bounds.minYMm + bounds.maxYMm + rows * heightMm) / 2;
  return Array.from({ length: columns * rows }, (_, index) => {
    const [column, row] = [index % columns, Math.floor(index / columns)];
    return {
      minXMm: left + column * widthMm,
      maxXMm: left + (column + 1) * widthMm,
      minYMm: top - (row + 1) * heightMm,
      maxYMm: top - row * heightMm,
    };
  });
}

/** The longest of 1, 2, 5, 10, … units of the floor that is no longer than this on paper; mm. */
export function scaleBarMm(scale: number, longestPt: number): number {
  const longest = (longestPt / PT_PER_MM) * scale;
  const power = 10 ** Math.floor(Math.log10(longest));
  return [5, 2, 1].map((factor) => factor * power).find((length) => length <= longest + 1e-9) ?? power;
}
