import { placedDoors, type PlacedDoor } from '@/lib/layout/guard-doors';
import type { GuardLine } from '@/lib/layout/items';
import type { Palette } from '@/lib/layout/palette';
import { strokeInk, type Ink } from '../ink';

const JAMB_PX = 4;
const SLIDING_GAP_PX = 4;

/** The doors of a guard line: jambs, the leaf where it stands open, and the way it takes there. Item frame. */
export function drawDoors(ink: Ink, palette: Palette, px: number, guard: GuardLine): void {
  for (const placed of placedDoors(guard)) {
    drawJambs(ink, palette, px, placed);
    if (placed.door.kind === 'sliding') drawSlidingLeaf(ink, palette, px, placed);
    else drawHingedLeaf(ink, palette, px, placed);
  }
}

function drawJambs(ink: Ink, palette: Palette, px: number, { fromMm, toMm, opensTo }: PlacedDoor): void {
  const [nx, ny] = [opensTo[0] * JAMB_PX * px, opensTo[1] * JAMB_PX * px];
  ink.beginPath();
  for (const [x, y] of [fromMm, toMm]) {
    ink.moveTo(x - nx, y - ny);
    ink.lineTo(x + nx, y + ny);
  }
  strokeInk(ink, palette.red, 1.6 * px);
}

function drawHingedLeaf(ink: Ink, palette: Palette, px: number, placed: PlacedDoor): void {
  const { door, fromMm, toMm, opensTo } = placed;
  const [hinge, latch] = door.hinge === 'start' ? [fromMm, toMm] : [toMm, fromMm];
  const width = Math.hypot(latch[0] - hinge[0], latch[1] - hinge[1]);
  const shut = Math.atan2(latch[1] - hinge[1], latch[0] - hinge[0]);
  const open = Math.atan2(opensTo[1], opensTo[0]);
  const isClockwise = Math.sin(open - shut) < 0;
  ink.beginPath();
  ink.arc(hinge[0], hinge[1], width, shut, open, isClockwise);
  strokeInk(ink, palette.inkSoft, 0.9 * px);
  ink.beginPath();
  ink.moveTo(...hinge);
  ink.lineTo(hinge[0] + opensTo[0] * width, hinge[1] + opensTo[1] * width);
  strokeInk(ink, palette.red, 1.6 * px);
}

/** The leaf half open beside the line, and where it ends when all the way open. */
function drawSlidingLeaf(ink: Ink, palette: Palette, px: number, placed: PlacedDoor): void {
  const { door, fromMm, toMm, opensTo } = placed;
  const [shut, away] = door.hinge === 'start' ? [toMm, fromMm] : [fromMm, toMm];
  const [wx, wy] = [away[0] - shut[0], away[1] - shut[1]];
  const [nx, ny] = [opensTo[0] * SLIDING_GAP_PX * px, opensTo[1] * SLIDING_GAP_PX * px];
  ink.beginPath();
  ink.moveTo(shut[0] + wx * 0.5 + nx, shut[1] + wy * 0.5 + ny);
  ink.lineTo(shut[0] + wx * 1.5 + nx, shut[1] + wy * 1.5 + ny);
  strokeInk(ink, palette.red, 1.6 * px);
  ink.beginPath();
  ink.moveTo(shut[0] + wx * 1.5 + nx, shut[1] + wy * 1.5 + ny);
  ink.lineTo(shut[0] + wx * 2 + nx, shut[1] + wy * 2 + ny);
  ink.setLineDash([3 * px, 3 * px]);
  strokeInk(ink, palette.inkSoft, 0.9 * px);
  ink.setLineDash([]);
}
