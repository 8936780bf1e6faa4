import type { ProtectiveDevice, Zone } from '@/lib/layout/items';
import type { Palette } from '@/lib/layout/palette';
import { letter, strokeInk, tracePath, uprightAngle, type Ink } from '../ink';
import { labelEdge } from './label-edge';

const radians = (degrees: number) => (degrees * Math.PI) / 180;
/** Distance of the hatching lines, px. */
const HATCH_PX = 14;
/** Below this length on the screen a name would only smudge the drawing. */
const LEAST_NAMED_PX = 60;

/** A zone: thin hatching inside a dashed edge, crossed both ways where no base may stand. Item frame. */
export function drawZone(ink: Ink, palette: Palette, px: number, zone: Zone): void {
  const colour = zone.use === 'keepOut' ? palette.red : palette.petrol;
  ink.save();
  tracePath(ink, zone.outlineMm, true);
  ink.clip();
  ink.globalAlpha = 0.28;
  hatch(ink, zone.outlineMm, HATCH_PX * px, 1);
  strokeInk(ink, colour, 0.9 * px);
  if (zone.use === 'keepOut') {
    hatch(ink, zone.outlineMm, HATCH_PX * px, -1);
    strokeInk(ink, colour, 0.9 * px);
  }
  ink.restore();
  tracePath(ink, zone.outlineMm, true);
  ink.setLineDash([8 * px, 4 * px]);
  strokeInk(ink, colour, 1.4 * px);
  ink.setLineDash([]);
}

/** Lines at 45° over the box of an outline; zoomed far out they stand wider apart, so that a large zone stays cheap. */
function hatch(ink: Ink, outline: Zone['outlineMm'], pitchMm: number, slope: 1 | -1): void {
  const xs = outline.map(([x]) => x);
  const ys = outline.map(([, y]) => y);
  const [left, right, bottom, top] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)];
  const height = top - bottom;
  const pitch = Math.max(pitchMm, (right - left + height) / 400);
  ink.beginPath();
  for (let x = left - height; x < right + height; x += pitch) {
    ink.moveTo(x, slope > 0 ? bottom : top);
    ink.lineTo(x + height, slope > 0 ? top : bottom);
  }
}

export function drawZoneName(ink: Ink, palette: Palette, px: number, zone: Zone): void {
  const edge = labelEdge(zone.outlineMm, radians(zone.angleDeg));
  if (edge.lengthMm / px < LEAST_NAMED_PX) return;
  letter(ink, palette, px, {
    text: `${zone.name}, ${zone.use === 'keepOut' ? 'no base here' : 'one robot at a time'}`,
    xMm: edge.xMm,
    yMm: edge.yMm,
    angleRad: edge.angleRad,
    offsetPx: [0, -9 * edge.side],
    weight: 400,
    colour: zone.use === 'keepOut' ? palette.red : palette.petrol,
  });
}

/** A protective device: a double line with short posts at its corners. Item frame. */
export function drawProtectiveDevice(ink: Ink, palette: Palette, px: number, device: ProtectiveDevice): void {
  tracePath(ink, device.pointsMm, false);
  strokeInk(ink, palette.red, 5 * px);
  tracePath(ink, device.pointsMm, false);
  strokeInk(ink, palette.sheet, 2.4 * px);
  ink.fillStyle = palette.red;
  for (const [x, y] of device.pointsMm) ink.fillRect(x - 4 * px, y - 4 * px, 8 * px, 8 * px);
}

export function drawProtectiveDeviceName(ink: Ink, palette: Palette, px: number, device: ProtectiveDevice): void {
  const [[x1, y1], [x2, y2]] = device.pointsMm;
  if (Math.hypot(x2 - x1, y2 - y1) < LEAST_NAMED_PX * px) return;
  const turn = radians(device.angleDeg);
  const { angleRad } = uprightAngle(Math.atan2(y2 - y1, x2 - x1) + turn);
  letter(ink, palette, px, {
    text: device.name,
    xMm: (x1 + x2) / 2,
    yMm: (y1 + y2) / 2,
    angleRad: angleRad - turn,
    offsetPx: [0, -12],
    weight: 400,
    colour: palette.red,
  });
}
