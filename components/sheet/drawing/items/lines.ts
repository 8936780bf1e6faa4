import type { Dimension, GuardLine, Walkway } from '@/lib/layout/items';
import { lengthFigure, lengthWords, type LengthUnit } from '@/lib/layout/length-units';
import type { Palette } from '@/lib/layout/palette';
import { fenceStrokes } from '@/lib/layout/guard-doors';
import { walkwayEdges } from '@/lib/layout/walkway-edges';
import { letter, strokeInk, tracePath, uprightAngle, type Ink, type PointMm } from '../ink';
import { drawDoors } from './guard-doors';

export { walkwayEdges } from '@/lib/layout/walkway-edges';

const radians = (degrees: number) => (degrees * Math.PI) / 180;

/** A guard line: red dots, the drawing's one loud line. Item frame. */
export function drawGuardLine(ink: Ink, palette: Palette, px: number, guard: GuardLine): void {
  ink.lineCap = 'round';
  ink.setLineDash([0, 6 * px]);
  if (guard.doors.length === 0) tracePath(ink, guard.pointsMm, guard.closed);
  else {
    ink.beginPath();
    for (const [from, to] of fenceStrokes(guard)) {
      ink.moveTo(...from);
      ink.lineTo(...to);
    }
  }
  strokeInk(ink, palette.red, 2.2 * px);
  ink.setLineDash([]);
  ink.lineCap = 'butt';
  drawDoors(ink, palette, px, guard);
}

/** The guard line's name stands over its upper left corner. */
export function drawGuardLineName(ink: Ink, palette: Palette, px: number, guard: GuardLine): void {
  const turn = radians(guard.angleDeg);
  const upperLeft = (point: PointMm) => {
    const x = Math.cos(turn) * point[0] - Math.sin(turn) * point[1];
    const y = Math.sin(turn) * point[0] + Math.cos(turn) * point[1];
    return y - x;
  };
  const corner = guard.pointsMm.reduce((best, point) => (upperLeft(point) > upperLeft(best) ? point : best));
  letter(ink, palette, px, {
    text: guard.name,
    xMm: corner[0],
    yMm: corner[1],
    angleRad: -turn,
    offsetPx: [10, -10],
    align: 'left',
    weight: 400,
    colour: palette.red,
  });
}

/** A walkway: chain lines along both edges. Item frame. */
export function drawWalkway(ink: Ink, palette: Palette, px: number, walkway: Walkway): void {
  ink.setLineDash([14 * px, 4 * px, 2 * px, 4 * px]);
  for (const edge of walkwayEdges(walkway.pointsMm, walkway.widthMm)) {
    tracePath(ink, edge, false);
    strokeInk(ink, palette.inkSoft, px);
  }
  ink.setLineDash([]);
}

/** The name, and the clear width where the name does not say it already. */
function walkwayWords({ name, widthMm }: Walkway, unit: LengthUnit): string {
  return name.includes(String(widthMm)) ? name : `${name}, keep ${lengthWords(widthMm, unit)} clear`;
}

/** What a walkway asks for, on its middle line near the beginning. */
export function drawWalkwayName(
  ink: Ink,
  palette: Palette,
  px: number,
  walkway: Walkway,
  unit: LengthUnit = 'mm',
): void {
  const [[x1, y1], [x2, y2]] = walkway.pointsMm;
  const turn = radians(walkway.angleDeg);
  const along = Math.atan2(y2 - y1, x2 - x1);
  const { angleRad, flipped } = uprightAngle(along + turn);
  if (Math.hypot(x2 - x1, y2 - y1) < 80 * px) return;
  letter(ink, palette, px, {
    text: walkwayWords(walkway, unit),
    xMm: flipped ? x2 : x1,
    yMm: flipped ? y2 : y1,
    angleRad: angleRad - turn,
    offsetPx: [16, 0],
    align: 'left',
    weight: 400,
    colour: palette.inkSoft,
  });
}

const ARROW_LENGTH_PX = 9;
const ARROW_HALF_PX = 2.6;

/** A dimension as a drawing office draws it: extension lines, arrows, and the length over the line, in millimetres or inches. */
export function drawDimension(
  ink: Ink,
  palette: Palette,
  px: number,
  dimension: Dimension,
  unit: LengthUnit = 'mm',
): void {
  const { fromMm, toMm, offsetMm } = dimension;
  const length = Math.hypot(toMm[0] - fromMm[0], toMm[1] - fromMm[1]);
  if (length === 0) return;
  const along = Math.atan2(toMm[1] - fromMm[1], toMm[0] - fromMm[0]);
  ink.save();
  ink.translate(fromMm[0], fromMm[1]);
  ink.rotate(along);
  const beyond = Math.sign(offsetMm || 1) * 6 * px;
  ink.beginPath();
  for (const x of [0, length]) {
    ink.moveTo(x, Math.abs(offsetMm) > 4 * px ? Math.sign(offsetMm) * 4 * px : 0);
    ink.lineTo(x, offsetMm + beyond);
  }
  ink.moveTo(0, offsetMm);
  ink.lineTo(length, offsetMm);
  strokeInk(ink, palette.ink, px);

  // Where the arrows would meet, they stand outside and point in.
  const outside = length < 3 * ARROW_LENGTH_PX * px;
  ink.fillStyle = palette.ink;
  for (const [tip, direction] of [
    [0, outside ? -1 : 1],
    [length, outside ? 1 : -1],
  ]) {
    tracePath(
      ink,
      [
        [tip, offsetMm],
        [tip + direction * ARROW_LENGTH_PX * px, offsetMm + ARROW_HALF_PX * px],
        [tip + direction * ARROW_LENGTH_PX * px, offsetMm - ARROW_HALF_PX * px],
      ],
      true,
    );
    ink.fill();
  }
  const { flipped } = uprightAngle(along + radians(dimension.angleDeg));
  letter(ink, palette, px, {
    text: lengthFigure(length, unit, 0),
    xMm: length / 2,
    yMm: offsetMm,
    angleRad: flipped ? Math.PI : 0,
    offsetPx: [0, -9],
    sizePx: 13,
    font: 'mono',
  });
  ink.restore();
}
