import type { SectionLine } from '@/lib/layout/items';
import type { Palette } from '@/lib/layout/palette';
import { letter, strokeInk, tracePath, type Ink } from '../ink';

const END_PX = 16;
const ARROW_PX = 15;

/**
 * A cutting plane as drawings show it: a thin chain line, thick at both ends, with arrows the way one looks (to the left of
 * from → to) and the letter at each. Item frame.
 */
export function drawSectionLine(ink: Ink, palette: Palette, px: number, section: SectionLine): void {
  const { fromMm, toMm } = section;
  const length = Math.hypot(toMm[0] - fromMm[0], toMm[1] - fromMm[1]);
  if (length === 0) return;
  const along = Math.atan2(toMm[1] - fromMm[1], toMm[0] - fromMm[0]);
  ink.save();
  ink.translate(fromMm[0], fromMm[1]);
  ink.rotate(along);
  ink.beginPath();
  ink.moveTo(0, 0);
  ink.lineTo(length, 0);
  ink.setLineDash([18 * px, 4 * px, 3 * px, 4 * px]);
  strokeInk(ink, palette.ink, 0.9 * px);
  ink.setLineDash([]);
  const end = Math.min(END_PX * px, length / 3);
  for (const [x, direction] of [
    [0, 1],
    [length, -1],
  ]) {
    ink.beginPath();
    ink.moveTo(x, 0);
    ink.lineTo(x + direction * end, 0);
    strokeInk(ink, palette.ink, 3 * px);
    ink.beginPath();
    ink.moveTo(x, 0);
    ink.lineTo(x, (ARROW_PX - 7) * px);
    strokeInk(ink, palette.ink, 1.4 * px);
    tracePath(
      ink,
      [
        [x, ARROW_PX * px],
        [x - 3.2 * px, (ARROW_PX - 9) * px],
        [x + 3.2 * px, (ARROW_PX - 9) * px],
      ],
      true,
    );
    ink.fillStyle = palette.ink;
    ink.fill();
  }
  ink.restore();
  const upright = -along - (section.angleDeg * Math.PI) / 180;
  ink.save();
  ink.translate(fromMm[0], fromMm[1]);
  ink.rotate(along);
  for (const [x, direction] of [
    [0, -1],
    [length, 1],
  ]) {
    letter(ink, palette, px, {
      text: section.letter,
      xMm: x + direction * 11 * px,
      yMm: 5 * px,
      angleRad: upright,
      sizePx: 15,
      weight: 600,
    });
  }
  ink.restore();
}
