import { ticks } from 'd3';
import { belowOutline, isoLines, reachOutline } from '@/lib/layout/contours';
import type { Calibration } from '@/lib/layout/calibration';
import { pictureToFloor } from '@/lib/layout/calibrate';
import type { FloorMap } from '@/lib/layout/floor-map';
import { PRINT_PALETTE } from '@/lib/layout/palette';
import type { ValueRange } from '@/lib/layout/scales';
import type { PlanFrame } from '../paper';
import { textWidth } from '../pen/fonts';
import { rectangle, segment, type Matrix, type Pen, type Picture, type Ring, type XY } from '../pen/pen';

/** What lies under the linework: the map with its lines, and the floor plan as ink on top of it. */

const { ink, inkSoft, red, sheet } = PRINT_PALETTE;

const ringsOnPage = (frame: PlanFrame, rings: readonly (readonly XY[])[]): Ring[] =>
  rings.map((points) => ({ closed: true, points: points.map(frame.toPage) }));

export interface DrawnMap {
  readonly map: FloorMap;
  readonly picture: Picture;
  readonly range: ValueRange;
  readonly threshold: number | null;
}

export function drawMap(pen: Pen, frame: PlanFrame, { map, picture, range, threshold }: DrawnMap): void {
  const { originMm, stepMm, columns, rows } = map.grid;
  const reached = ringsOnPage(frame, reachOutline(map));
  pen.within(reached, () => {
    const [left, top] = frame.toPage([originMm[0] - stepMm / 2, originMm[1] + (rows - 0.5) * stepMm]);
    const [across, down] = [
      (columns * stepMm * frame.ptPerMm) / picture.widthPx,
      (rows * stepMm * frame.ptPerMm) / picture.heightPx,
    ];
    pen.picture(picture, [across, 0, 0, down, left, top]);
    if (threshold !== null && map.measure !== 'reach') drawBelow(pen, frame, map, threshold);
  });
  pen.path(reached, { stroke: inkSoft, strokeOpacity: 0.6, width: 0.5 });
  if (map.measure !== 'reach') drawIsoLines(pen, frame, map, range);
}

/** Floor below the threshold is hatched in paper, so that its colour still reads between the lines. */
function drawBelow(pen: Pen, frame: PlanFrame, map: FloorMap, threshold: number): void {
  const below = ringsOnPage(frame, belowOutline(map, threshold));
  if (below.length === 0) return;
  pen.within(below, () => pen.path(hatching(frame), { stroke: sheet, strokeOpacity: 0.8, width: 0.9 }));
  pen.path(below, { stroke: red, width: 0.5 });
}

function hatching({ box }: PlanFrame): Ring[] {
  const lines: Ring[] = [];
  for (let at = -box.height; at < box.width; at += 4) {
    lines.push(segment([box.x + at, box.y + box.height], [box.x + at + box.height, box.y]));
  }
  return lines;
}

function drawIsoLines(pen: Pen, frame: PlanFrame, map: FloorMap, range: ValueRange): void {
  const levels = ticks(range.from, range.to, 6).filter((level) => level > range.from && level < range.to);
  const placed: XY[] = [];
  for (const { value, lines, labels } of isoLines(map, levels)) {
    pen.path(
      lines.map((points) => ({ closed: false, points: points.map(frame.toPage) })),
      { stroke: ink, strokeOpacity: 0.45, width: 0.35, round: true },
    );
    for (const { xMm, yMm, angleRad } of labels) {
      const at = frame.toPage([xMm, yMm]);
      if (placed.some(([x, y]) => Math.hypot(x - at[0], y - at[1]) < 42)) continue;
      placed.push(at);
      drawLabel(pen, String(Number(value.toPrecision(3))), at, (angleRad * 180) / Math.PI);
    }
  }
}

function drawLabel(pen: Pen, text: string, [x, y]: XY, angleDeg: number): void {
  const size = 5.5;
  const width = textWidth(text, 'mono', size) + 2;
  const turn = (-angleDeg * Math.PI) / 180;
  const corner = (dx: number, dy: number): XY => [
    x + dx * Math.cos(turn) - dy * Math.sin(turn),
    y + dx * Math.sin(turn) + dy * Math.cos(turn),
  ];
  const [w, h] = [width / 2, size * 0.55];
  const backing = { closed: true, points: [corner(-w, -h), corner(w, -h), corner(w, h), corner(-w, h)] };
  pen.path([backing], { fill: sheet, fillOpacity: 0.75 });
  const [tx, ty] = corner(0, size * 0.33);
  pen.text(text, tx, ty, { face: 'mono', size, align: 'center', angleDeg });
}

/** The floor plan where its calibration puts it, as ink over the map's colours. */
export function drawFloorPlan(
  pen: Pen,
  frame: PlanFrame,
  picture: Picture,
  { widthPx, heightPx, calibration }: { widthPx: number; heightPx: number; calibration: Calibration },
): void {
  const place = (x: number, y: number): XY => frame.toPage(pictureToFloor(calibration, [x, y]));
  const [origin, right, down] = [place(0, 0), place(widthPx, 0), place(0, heightPx)];
  const matrix: Matrix = [
    (right[0] - origin[0]) / picture.widthPx,
    (right[1] - origin[1]) / picture.widthPx,
    (down[0] - origin[0]) / picture.heightPx,
    (down[1] - origin[1]) / picture.heightPx,
    origin[0],
    origin[1],
  ];
  pen.picture(picture, matrix, { multiply: true, opacity: 0.55 });
}

export const boxRing = ({ box }: PlanFrame): Ring => rectangle(box.x, box.y, box.width, box.height);
