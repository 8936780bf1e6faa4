import type { Fixture, TaskPoint } from '@/lib/layout/items';
import type { Palette } from '@/lib/layout/palette';
import { bandColour, letter, strokeInk, tracePath, type Ink } from '../ink';
import type { DrawnBand } from '../types';

const HALF_PX = 5;
/** How near a press must come to take hold of a task point, px. */
const GRIP_PX = 10;

/** Task points as small diamonds coloured by verdict; those not computed yet are hollow. Item frame. */
export function drawTaskPoints(
  ink: Ink,
  palette: Palette,
  px: number,
  fixture: Fixture,
  verdicts: ReadonlyMap<string, DrawnBand> | undefined,
  chosenId: string | null,
  isNumbered = false,
): void {
  if (isNumbered) drawOrder(ink, palette, px, fixture);
  for (const point of fixture.taskPoints) {
    drawHeading(ink, palette, px, point);
    const band = verdicts?.get(point.id) ?? 'unknown';
    const half = (point.id === chosenId ? HALF_PX + 2 : HALF_PX) * px;
    const { xMm: x, yMm: y } = point;
    tracePath(
      ink,
      [
        [x, y + half],
        [x + half, y],
        [x, y - half],
        [x - half, y],
      ],
      true,
    );
    ink.fillStyle = band === 'unknown' ? palette.sheet : bandColour(palette, band);
    ink.fill();
    // Out of reach must not rest on colour alone: its diamond is crossed.
    strokeInk(ink, band === 'unknown' ? palette.inkSoft : palette.sheet, 1.2 * px);
    if (band === 'out' || band === 'pinned') {
      const arm = half * 0.42;
      ink.beginPath();
      ink.moveTo(x - arm, y);
      ink.lineTo(x + arm, y);
      if (band === 'out') {
        ink.moveTo(x, y - arm);
        ink.lineTo(x, y + arm);
      }
      strokeInk(ink, palette.sheet, 1.3 * px);
    }
    if (point.id === chosenId) {
      letter(ink, palette, px, {
        text: point.name,
        xMm: x,
        yMm: y,
        angleRad: (-fixture.angleDeg * Math.PI) / 180,
        offsetPx: [0, -15],
        weight: 600,
      });
    }
  }
}

/** The order of the work, as a number beside each point. */
function drawOrder(ink: Ink, palette: Palette, px: number, fixture: Fixture): void {
  const inOrder = [...fixture.taskPoints].sort((one, other) => one.order - other.order);
  inOrder.forEach(({ xMm, yMm }, index) =>
    letter(ink, palette, px, {
      text: String(index + 1),
      xMm,
      yMm,
      angleRad: (-fixture.angleDeg * Math.PI) / 180,
      offsetPx: [-10, 9],
      sizePx: 11,
      font: 'mono',
    }),
  );
}

const HEADING_PX = 16;
const LEAST_TILT_DEG = 5;

/** Where a tilted tool points, as long as it leans; one that points straight up or down needs no mark. */
function drawHeading(ink: Ink, palette: Palette, px: number, { xMm, yMm, tiltDeg, azimuthDeg }: TaskPoint): void {
  if (tiltDeg < LEAST_TILT_DEG || tiltDeg > 180 - LEAST_TILT_DEG) return;
  const heading = (azimuthDeg * Math.PI) / 180;
  const length = (HALF_PX + HEADING_PX * Math.sin((tiltDeg * Math.PI) / 180)) * px;
  const [x, y] = [xMm + length * Math.cos(heading), yMm + length * Math.sin(heading)];
  ink.beginPath();
  ink.moveTo(xMm, yMm);
  ink.lineTo(x, y);
  strokeInk(ink, palette.ink, 1.3 * px);
  const barb = 4 * px;
  const back = (turn: number): [number, number] => [
    x + barb * Math.cos(heading + turn),
    y + barb * Math.sin(heading + turn),
  ];
  tracePath(ink, [back(2.7), [x, y], back(-2.7)], false);
  strokeInk(ink, palette.ink, 1.3 * px);
}

/** The task point that a press at this place of the item's frame takes hold of, the nearest first. */
export function taskPointAt(fixture: Fixture, xMm: number, yMm: number, px: number): TaskPoint | null {
  let nearest: TaskPoint | null = null;
  let least = GRIP_PX * px;
  for (const point of fixture.taskPoints) {
    const distance = Math.hypot(point.xMm - xMm, point.yMm - yMm);
    if (distance > least) continue;
    least = distance;
    nearest = point;
  }
  return nearest;
}
