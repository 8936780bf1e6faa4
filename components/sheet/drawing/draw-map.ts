import type { IsoLine } from '@/lib/layout/contours';
import type { FloorGrid } from '@/lib/layout/floor-map';
import type { Palette } from '@/lib/layout/palette';
import { hatchPattern } from './hatch';
import { letter, strokeInk, type Ink, type PointMm } from './ink';

/** Draw functions of maps; floor frame, px is one screen pixel in millimetres. */

const HATCH_SPACING_PX = 7;
const EDGE_SPACING_PX = 5;
const EDGE_WIDTH_PX = 5;
/** A pixel of more floor than this leaves no room for labels, mm. */
const LARGEST_LABELLED_PX_MM = 10;
/** Cells that are smaller than this on the screen are blended, larger ones stay cells. */
const BLENDED_CELL_PX = 1.5;

export function pathOf(rings: readonly (readonly PointMm[])[]): Path2D {
  const path = new Path2D();
  for (const ring of rings) {
    ring.forEach(([x, y], index) => (index === 0 ? path.moveTo(x, y) : path.lineTo(x, y)));
    path.closePath();
  }
  return path;
}

/** One pixel a cell onto the floor; a cell's colour lies about its centre. */
export function drawGroundImage(ink: Ink, image: HTMLCanvasElement, grid: FloorGrid, px: number): void {
  ink.imageSmoothingEnabled = grid.stepMm / px < BLENDED_CELL_PX;
  ink.drawImage(
    image,
    grid.originMm[0] - grid.stepMm / 2,
    grid.originMm[1] - grid.stepMm / 2,
    grid.columns * grid.stepMm,
    grid.rows * grid.stepMm,
  );
  ink.imageSmoothingEnabled = true;
}

/** Hatches a part of the map in paper, so that its colour still reads between the lines; `edge` rules round it. */
export function drawHatched(ink: Ink, palette: Palette, px: number, area: Path2D, edge: string | null): void {
  const pattern = hatchPattern(ink, palette.sheet, px, HATCH_SPACING_PX);
  if (!pattern) return;
  ink.save();
  ink.globalAlpha = 0.75;
  ink.fillStyle = pattern;
  ink.fill(area, 'evenodd');
  if (edge) {
    ink.strokeStyle = edge;
    ink.lineWidth = px;
    ink.stroke(area);
  }
  ink.restore();
}

/** A narrow band of hatching just outside the reached floor, as material is shown beyond an edge. */
export function drawHatchEdge(ink: Ink, palette: Palette, px: number, reached: Path2D, grid: FloorGrid): void {
  const pattern = hatchPattern(ink, palette.inkSoft, px, EDGE_SPACING_PX);
  if (!pattern) return;
  const outside = new Path2D();
  const margin = 4 * grid.stepMm + 20 * px;
  outside.rect(
    grid.originMm[0] - margin,
    grid.originMm[1] - margin,
    grid.columns * grid.stepMm + 2 * margin,
    grid.rows * grid.stepMm + 2 * margin,
  );
  outside.addPath(reached);
  ink.save();
  ink.save();
  ink.clip(outside, 'evenodd');
  ink.globalAlpha = 0.4;
  ink.lineJoin = 'round';
  ink.lineWidth = 2 * EDGE_WIDTH_PX * px;
  ink.strokeStyle = pattern;
  ink.stroke(reached);
  ink.restore();
  ink.globalAlpha = 0.45;
  ink.lineWidth = px;
  ink.strokeStyle = palette.inkSoft;
  ink.stroke(reached);
  ink.restore();
}

/** A thin edge where the best robot changes, or with less width its best branch. */
export function drawRealmEdges(ink: Ink, palette: Palette, px: number, edges: Float32Array, widthPx = 1.2): void {
  if (edges.length === 0) return;
  ink.beginPath();
  for (let index = 0; index < edges.length; index += 4) {
    ink.moveTo(edges[index], edges[index + 1]);
    ink.lineTo(edges[index + 2], edges[index + 3]);
  }
  ink.globalAlpha = 0.55;
  strokeInk(ink, palette.sheet, widthPx * px);
  ink.globalAlpha = 1;
}

/** Lines of equal value with their values set into them. */
export function drawIsoLines(ink: Ink, palette: Palette, px: number, isoLines: readonly IsoLine[]): void {
  ink.lineJoin = 'round';
  for (const { lines } of isoLines) {
    ink.beginPath();
    for (const line of lines) {
      line.forEach(([x, y], index) => (index === 0 ? ink.moveTo(x, y) : ink.lineTo(x, y)));
    }
    ink.globalAlpha = 0.4;
    strokeInk(ink, palette.ink, 0.8 * px);
    ink.globalAlpha = 1;
  }
  // On a small drawing labels would cover more than they say.
  if (px > LARGEST_LABELLED_PX_MM) return;
  // Two labels nearer than this would only cover one another.
  const least = 70 * px;
  const placed: PointMm[] = [];
  for (const { value, labels } of isoLines) {
    for (const { xMm, yMm, angleRad } of labels) {
      if (placed.some(([x, y]) => Math.hypot(x - xMm, y - yMm) < least)) continue;
      placed.push([xMm, yMm]);
      const text = String(Number(value.toPrecision(3)));
      letter(ink, palette, px, { text, xMm, yMm, angleRad, sizePx: 10, font: 'mono', weight: 500 });
    }
  }
}
