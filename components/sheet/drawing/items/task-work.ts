import type { Palette } from '@/lib/layout/palette';
import { bandColour, strokeInk, traceCircle, tracePath, type Ink, type PointMm } from '../ink';
import type { DrawnBand } from '../types';

/** A task path or pattern as it is drawn: places and lines on the floor, mm. */
export interface DrawnPath {
  readonly id: string;
  readonly name: string;
  readonly line: readonly PointMm[];
  readonly corners: readonly PointMm[];
  /** The slowest stretch. */
  readonly weakest: readonly PointMm[];
  readonly band: DrawnBand;
}

export interface DrawnPattern {
  readonly id: string;
  readonly name: string;
  /** In the order of the places; layers lie over one another, so only the worst of each stack is drawn. */
  readonly places: readonly { readonly at: PointMm; readonly band: DrawnBand }[];
  readonly worst: PointMm | null;
}

/** A seam in the colour of its verdict; its weakest stretch thick, with bars across its ends so that it rests not on colour alone. */
export function drawPath(ink: Ink, palette: Palette, px: number, path: DrawnPath, chosen: boolean): void {
  const colour = path.band === 'unknown' ? palette.inkSoft : bandColour(palette, path.band);
  ink.lineJoin = 'round';
  tracePath(ink, path.line, false);
  strokeInk(ink, palette.sheet, (chosen ? 7 : 5) * px);
  tracePath(ink, path.line, false);
  if (path.band === 'out') ink.setLineDash([5 * px, 3 * px]);
  strokeInk(ink, colour, (chosen ? 3 : 2) * px);
  ink.setLineDash([]);
  if (path.weakest.length > 1) {
    tracePath(ink, path.weakest, false);
    strokeInk(ink, colour, (chosen ? 6.5 : 5) * px);
    for (const [end, next] of [
      [path.weakest[0], path.weakest[1]],
      [path.weakest[path.weakest.length - 1], path.weakest[path.weakest.length - 2]],
    ]) {
      const length = Math.hypot(next[0] - end[0], next[1] - end[1]) || 1;
      const [nx, ny] = [(-(next[1] - end[1]) / length) * 7 * px, ((next[0] - end[0]) / length) * 7 * px];
      tracePath(
        ink,
        [
          [end[0] - nx, end[1] - ny],
          [end[0] + nx, end[1] + ny],
        ],
        false,
      );
      strokeInk(ink, palette.ink, 1.5 * px);
    }
  }
  for (const [x, y] of path.corners) {
    traceCircle(ink, x, y, (chosen ? 3.5 : 2.5) * px);
    ink.fillStyle = palette.sheet;
    ink.fill();
    strokeInk(ink, colour, 1.4 * px);
  }
}

/** Places as small squares in the colour of their verdicts, out of reach crossed; the worst one ringed. */
export function drawPattern(ink: Ink, palette: Palette, px: number, pattern: DrawnPattern, chosen: boolean): void {
  const half = (chosen ? 4.5 : 3.5) * px;
  for (const {
    at: [x, y],
    band,
  } of pattern.places) {
    tracePath(
      ink,
      [
        [x - half, y - half],
        [x + half, y - half],
        [x + half, y + half],
        [x - half, y + half],
      ],
      true,
    );
    ink.fillStyle = band === 'unknown' ? palette.sheet : bandColour(palette, band);
    ink.fill();
    strokeInk(ink, band === 'unknown' ? palette.inkSoft : palette.sheet, px);
    if (band !== 'out') continue;
    tracePath(
      ink,
      [
        [x - half * 0.5, y - half * 0.5],
        [x + half * 0.5, y + half * 0.5],
      ],
      false,
    );
    strokeInk(ink, palette.sheet, 1.3 * px);
  }
  if (pattern.worst) {
    traceCircle(ink, pattern.worst[0], pattern.worst[1], half + 4 * px);
    strokeInk(ink, palette.ink, 1.4 * px);
  }
}
