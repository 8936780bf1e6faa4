import type Konva from 'konva';
import type { Palette } from '@/lib/layout/palette';

/**
 * Helpers of the draw functions. Every draw function works on a plain 2D context whose unit is the millimetre and whose y
 * axis points away (the stage flips it), and gets `px`, the length of one screen pixel in those millimetres, so that line
 * widths and lettering keep their size on the screen at every zoom.
 */

export type Ink = CanvasRenderingContext2D;

/** The plain context behind Konva's, so that draw functions can also be used without Konva. */
export function inkOf(context: Konva.Context): Ink {
  return context._context as Ink;
}

/** One screen pixel in the node's own millimetres. */
export function pixelOf(node: Konva.Node): number {
  const { x } = node.getAbsoluteScale();
  return x > 0 ? 1 / x : 1;
}

export type PointMm = readonly [number, number];

/** Starts a path through the points. */
export function tracePath(ink: Ink, points: readonly PointMm[], closed: boolean): void {
  ink.beginPath();
  points.forEach(([x, y], index) => (index === 0 ? ink.moveTo(x, y) : ink.lineTo(x, y)));
  if (closed) ink.closePath();
}

export function traceCircle(ink: Ink, x: number, y: number, radius: number): void {
  ink.beginPath();
  ink.arc(x, y, radius, 0, 2 * Math.PI);
}

export function strokeInk(ink: Ink, colour: string, width: number): void {
  ink.strokeStyle = colour;
  ink.lineWidth = width;
  ink.stroke();
}

export interface Lettering {
  readonly text: string;
  readonly xMm: number;
  readonly yMm: number;
  /** Turn of the baseline, counter-clockwise radians in the current frame. */
  readonly angleRad?: number;
  /** Offset from the point after turning, px: right and down. */
  readonly offsetPx?: readonly [number, number];
  readonly sizePx?: number;
  readonly weight?: 400 | 500 | 600;
  readonly font?: 'sans' | 'mono';
  readonly colour?: string;
  readonly align?: CanvasTextAlign;
  readonly baseline?: CanvasTextBaseline;
  readonly halo?: boolean;
}

/** Letters at a fixed size on the screen, on a halo of paper so that they stay readable over the map. */
export function letter(ink: Ink, palette: Palette, px: number, lettering: Lettering): void {
  const [right, down] = lettering.offsetPx ?? [0, 0];
  ink.save();
  ink.translate(lettering.xMm, lettering.yMm);
  if (lettering.angleRad) ink.rotate(lettering.angleRad);
  ink.scale(px, -px);
  ink.font = `${lettering.weight ?? 500} ${lettering.sizePx ?? 12}px ${palette[lettering.font ?? 'sans']}`;
  ink.textAlign = lettering.align ?? 'center';
  ink.textBaseline = lettering.baseline ?? 'middle';
  if (lettering.halo !== false) {
    ink.lineJoin = 'round';
    ink.lineWidth = 4;
    ink.strokeStyle = palette.sheet;
    ink.strokeText(lettering.text, right, down);
  }
  ink.fillStyle = lettering.colour ?? palette.ink;
  ink.fillText(lettering.text, right, down);
  ink.restore();
}

/** Turns a baseline by half a turn where letters would stand on their heads. `angleRad` is counter-clockwise on the floor. */
export function uprightAngle(angleRad: number): { readonly angleRad: number; readonly flipped: boolean } {
  const turned = Math.atan2(Math.sin(angleRad), Math.cos(angleRad));
  const flipped = turned > Math.PI / 2 + 1e-6 || turned <= -Math.PI / 2 + 1e-6;
  return { angleRad: flipped ? angleRad + Math.PI : angleRad, flipped };
}

/** The verdict colours of a task point. */
export function bandColour(palette: Palette, band: string | undefined): string {
  switch (band) {
    case 'roomy':
    case 'fair':
      return palette.green;
    case 'tight':
      return palette.board === 'day' ? '#b87700' : palette.amber;
    case 'pinned':
    case 'out':
      return palette.red;
    default:
      return palette.inkSoft;
  }
}
