import type { ReportInput, ReportOptions } from '@/lib/contracts/reports';
import type { FloorBounds } from '@/lib/layout/viewport';
import { boundsOfPoints, unionBounds } from '@/lib/layout/viewport';
import { PRINT_PALETTE } from '@/lib/layout/palette';
import type { ValueRange } from '@/lib/layout/scales';
import { pictureToFloor } from '@/lib/layout/calibrate';
import { reachOutline } from '@/lib/layout/contours';
import { paperOf, planFrame, pt, type Box } from '../paper';
import type { Pen, Picture } from '../pen/pen';
import type { ReportSheet } from '../report-sheet';
import { boxRing, drawFloorPlan, drawMap } from './ground';
import { drawKey } from './key';
import { drawLines } from './plan-lines';
import { drawFoot, drawTitleBlock, TITLE_HEIGHT } from './title-block';

const { ink } = PRINT_PALETTE;

/** Everything that the plan has to show: what was drawn, and the floor that is reached. */
export function sheetBounds({ shapes, map, snapshot }: ReportSheet): FloorBounds {
  const points = shapes.flatMap((shape): (readonly [number, number])[] => {
    if (shape.kind === 'line') return [...shape.points];
    // A ring of reach is no thing that stands there; where there is a map, it says how far the arm gets.
    if (shape.kind === 'circle') {
      if (shape.layer === 'REACH') return [];
      const [[x, y], r] = [shape.centre, shape.radiusMm];
      return [[x - r, y - r], [x + r, y + r]]; // prettier-ignore
    }
    return [[shape.at[0], shape.at[1]]];
  });
  const reached = map ? boundsOfPoints(reachOutline(map).flat()) : null;
  const drawn = unionBounds(boundsOfPoints(points), reached);
  const { floorPlan } = snapshot;
  const found = drawn ?? (floorPlan?.calibration ? planBounds(floorPlan, floorPlan.calibration) : null);
  const { minXMm, minYMm, maxXMm, maxYMm } = found ?? { minXMm: 0, minYMm: 0, maxXMm: 5000, maxYMm: 4000 };
  const edge = 0.02 * Math.max(maxXMm - minXMm, maxYMm - minYMm, 1000);
  return { minXMm: minXMm - edge, minYMm: minYMm - edge, maxXMm: maxXMm + edge, maxYMm: maxYMm + edge };
}

function planBounds(
  { widthPx, heightPx }: { widthPx: number; heightPx: number },
  calibration: Parameters<typeof pictureToFloor>[0],
): FloorBounds | null {
  const corners = [[0, 0], [widthPx, 0], [0, heightPx], [widthPx, heightPx]] as const; // prettier-ignore
  return boundsOfPoints(corners.map((corner) => pictureToFloor(calibration, corner)));
}

const GAP = 9;

/** Where plan and key stand on the page. */
export function sheetBoxes(paperName: ReportOptions['paper']): { title: Box; plan: Box; key: Box } {
  const paper = paperOf(paperName);
  const { widthPt, heightPt, marginPt } = paper;
  const top = marginPt + TITLE_HEIGHT + GAP;
  const bottom = heightPt - marginPt - 8;
  const keyWidth = pt(paperName === 'A4' ? 54 : 66);
  const width = widthPt - 2 * marginPt;
  return {
    title: { x: marginPt, y: marginPt, width, height: TITLE_HEIGHT },
    plan: { x: marginPt, y: top, width: width - keyWidth - GAP, height: bottom - top },
    key: { x: widthPt - marginPt - keyWidth, y: top, width: keyWidth, height: bottom - top },
  };
}

export interface SheetPage {
  readonly input: ReportInput;
  readonly options: ReportOptions;
  readonly sheet: ReportSheet;
  readonly mapPicture: Picture | null;
  readonly range: ValueRange;
  readonly bounds: FloorBounds;
  readonly scale: number;
  /** `Plan`, or `Plan 2 of 4`. */
  readonly name: string;
  readonly foot: string;
}

/** One page of the plan. */
export function drawSheetPage(pen: Pen, page: SheetPage): void {
  const { input, options, sheet, mapPicture, range, bounds, scale } = page;
  const boxes = sheetBoxes(options.paper);
  const frame = planFrame(bounds, boxes.plan, scale);
  drawTitleBlock(pen, boxes.title, input, `1:${scale}`, page.name);
  const { floorPlan, items, arms } = sheet.snapshot;
  const reachOfArm = new Map(arms.map(({ id, reachMm }) => [id, reachMm]));
  const reachOf = new Map(
    items.flatMap((item) => (item.kind === 'robot' ? [[item.id, reachOfArm.get(item.armId) ?? 0] as const] : [])),
  );
  pen.within([boxRing(frame)], () => {
    if (sheet.map && mapPicture)
      drawMap(pen, frame, { map: sheet.map, picture: mapPicture, range, threshold: sheet.threshold });
    if (sheet.picture && floorPlan?.calibration)
      drawFloorPlan(pen, frame, sheet.picture, { ...floorPlan, calibration: floorPlan.calibration });
    drawLines(pen, frame, sheet.shapes, sheet.verdicts, reachOf);
  });
  pen.path([boxRing(frame)], { stroke: ink, width: 0.9 });
  drawKey(pen, boxes.key, sheet, range, options.mapScale, frame);
  drawFoot(pen, paperOf(options.paper), input, page.foot);
}
