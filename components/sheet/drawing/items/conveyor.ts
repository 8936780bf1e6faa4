import type { Conveyor } from '@/lib/layout/items';
import type { Palette } from '@/lib/layout/palette';
import { walkwayEdges } from '@/lib/layout/walkway-edges';
import { letter, strokeInk, tracePath, uprightAngle, type Ink, type PointMm } from '../ink';

/** Rollers are drawn no closer than this, px, and no closer than they stand, mm. */
const LEAST_ROLLER_PX = 7;
const ROLLER_MM = 120;
const LEAST_NAMED_PX = 40;
const ARROW_PX = 9;

/** The outline of a conveyor's belt or rollers, as one closed polygon. */
export function conveyorOutline({ pointsMm, widthMm }: Pick<Conveyor, 'pointsMm' | 'widthMm'>): PointMm[] {
  const [left, right] = walkwayEdges(pointsMm, widthMm);
  return [...left, ...[...right].reverse()];
}

/** A conveyor from above: frame, rollers and an arrow where it carries. Item frame. */
export function drawConveyor(ink: Ink, palette: Palette, px: number, conveyor: Conveyor): void {
  const outline = conveyorOutline(conveyor);
  ink.lineJoin = 'miter';
  tracePath(ink, outline, true);
  ink.globalAlpha = 0.82;
  ink.fillStyle = palette.sheet;
  ink.fill();
  ink.globalAlpha = 0.4;
  drawRollers(ink, palette, px, conveyor);
  ink.globalAlpha = 1;
  tracePath(ink, outline, true);
  strokeInk(ink, palette.ink, 1.6 * px);
  drawCarryingArrow(ink, palette, px, conveyor);
}

function drawRollers(ink: Ink, palette: Palette, px: number, { pointsMm, widthMm }: Conveyor): void {
  const pitch = Math.max(ROLLER_MM, LEAST_ROLLER_PX * px);
  const half = widthMm / 2;
  ink.beginPath();
  for (let index = 1; index < pointsMm.length; index += 1) {
    const [[x1, y1], [x2, y2]] = [pointsMm[index - 1], pointsMm[index]];
    const length = Math.hypot(x2 - x1, y2 - y1);
    if (length === 0) continue;
    const [ux, uy] = [(x2 - x1) / length, (y2 - y1) / length];
    // In a bend the rollers of both legs would lie over one another.
    const begin = index > 1 ? half : 0;
    const end = index < pointsMm.length - 1 ? length - half : length;
    for (let along = begin + pitch / 2; along < end; along += pitch) {
      const [x, y] = [x1 + ux * along, y1 + uy * along];
      ink.moveTo(x - uy * half, y + ux * half);
      ink.lineTo(x + uy * half, y - ux * half);
    }
  }
  strokeInk(ink, palette.ink, 0.8 * px);
}

/** At the end of the last leg, on a spot of paper. */
function drawCarryingArrow(ink: Ink, palette: Palette, px: number, { pointsMm, widthMm }: Conveyor): void {
  const [[x1, y1], [x2, y2]] = [pointsMm[pointsMm.length - 2], pointsMm[pointsMm.length - 1]];
  const length = Math.hypot(x2 - x1, y2 - y1);
  if (length < 6 * ARROW_PX * px || widthMm < ARROW_PX * px) return;
  ink.save();
  ink.translate(x2, y2);
  ink.rotate(Math.atan2(y2 - y1, x2 - x1));
  ink.beginPath();
  ink.moveTo(-4.5 * ARROW_PX * px, 0);
  ink.lineTo(-1.6 * ARROW_PX * px, 0);
  strokeInk(ink, palette.sheet, 5 * px);
  strokeInk(ink, palette.ink, 1.4 * px);
  tracePath(
    ink,
    [
      [-0.9 * ARROW_PX * px, 0],
      [-1.9 * ARROW_PX * px, 0.36 * ARROW_PX * px],
      [-1.9 * ARROW_PX * px, -0.36 * ARROW_PX * px],
    ],
    true,
  );
  ink.fillStyle = palette.ink;
  ink.fill();
  ink.restore();
}

/** The name beside the conveyor's longest leg, on its lower side. */
export function drawConveyorName(ink: Ink, palette: Palette, px: number, conveyor: Conveyor): void {
  const turn = (conveyor.angleDeg * Math.PI) / 180;
  const legs = conveyor.pointsMm.slice(1).map((to, index) => ({ from: conveyor.pointsMm[index], to }));
  const lengthOf = ({ from, to }: (typeof legs)[number]) => Math.hypot(to[0] - from[0], to[1] - from[1]);
  const longest = legs.reduce((best, leg) => (lengthOf(leg) > lengthOf(best) ? leg : best));
  if (lengthOf(longest) < LEAST_NAMED_PX * px) return;
  const along = Math.atan2(longest.to[1] - longest.from[1], longest.to[0] - longest.from[0]);
  const { angleRad } = uprightAngle(along + turn);
  letter(ink, palette, px, {
    text: conveyor.name,
    xMm: (longest.from[0] + longest.to[0]) / 2,
    yMm: (longest.from[1] + longest.to[1]) / 2,
    angleRad: angleRad - turn,
    offsetPx: [0, conveyor.widthMm / 2 / px + 10],
    weight: 600,
  });
}
