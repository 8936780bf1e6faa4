import type { Robot } from '@/lib/layout/items';
import type { Palette } from '@/lib/layout/palette';
import { letter, strokeInk, traceCircle, type Ink, type PointMm } from '../ink';
import type { RobotSticks } from '../robot-sticks';

/** The thinnest a link or base may get on the screen and still be seen as one. */
const LEAST_LINK_PX = 4;
const LEAST_BASE_PX = 7;

/** How far the arm may ever reach: a thin dashed ring. Robot frame. */
export function drawReachRing(ink: Ink, palette: Palette, px: number, reachMm: number): void {
  traceCircle(ink, 0, 0, reachMm);
  ink.setLineDash([3 * px, 5 * px]);
  ink.globalAlpha = 0.55;
  strokeInk(ink, palette.inkSoft, px);
  ink.globalAlpha = 1;
  ink.setLineDash([]);
}

/** Base, links, joints and tool point of a robot from above; without a posture only its base. Robot frame. */
export function drawRobot(ink: Ink, palette: Palette, px: number, sticks: RobotSticks, hasPosture: boolean): void {
  const base = Math.max(sticks.baseRadiusMm, LEAST_BASE_PX * px);
  const width = Math.max(sticks.linkWidthMm, LEAST_LINK_PX * px);
  const line = 1.6 * px;

  traceCircle(ink, 0, 0, base);
  ink.fillStyle = palette.sheet;
  ink.fill();
  strokeInk(ink, palette.ink, line);
  // Where the base looks: a notch at the plate's edge.
  ink.beginPath();
  ink.moveTo(base, 0);
  ink.lineTo(base + 5 * px, 0);
  strokeInk(ink, palette.ink, 2 * px);
  traceCircle(ink, 0, 0, base * 0.52);
  strokeInk(ink, palette.ink, px);

  if (hasPosture) {
    ink.lineCap = 'round';
    for (const { from, to } of sticks.sticks) drawLink(ink, palette, from, to, width, line);
    ink.lineCap = 'butt';
    for (const [x, y] of sticks.joints) {
      traceCircle(ink, x, y, width * 0.62);
      ink.fillStyle = palette.sheet;
      ink.fill();
      strokeInk(ink, palette.ink, line);
    }
  }
  traceCircle(ink, 0, 0, base * 0.3);
  ink.fillStyle = palette.sheet;
  ink.fill();
  strokeInk(ink, palette.ink, px);
  if (hasPosture) {
    traceCircle(ink, ...sticks.toolPoint, 4.2 * px);
    ink.fillStyle = palette.red;
    ink.fill();
    strokeInk(ink, palette.ink, px);
  }
}

/** One link: the same round-ended line twice, ink and then paper, leaves an outline without computing one. */
function drawLink(ink: Ink, palette: Palette, from: PointMm, to: PointMm, width: number, line: number): void {
  ink.beginPath();
  ink.moveTo(...from);
  ink.lineTo(...to);
  strokeInk(ink, palette.ink, width + line);
  strokeInk(ink, palette.sheet, width - line);
}

export function drawRobotName(ink: Ink, palette: Palette, px: number, robot: Robot, baseRadiusMm: number): void {
  const base = Math.max(baseRadiusMm, LEAST_BASE_PX * px);
  letter(ink, palette, px, {
    text: robot.name,
    xMm: 0,
    yMm: 0,
    angleRad: (-robot.angleDeg * Math.PI) / 180,
    offsetPx: [0, base / px + 11],
    weight: 600,
  });
}
