import { rgb } from 'd3';
import { floorHistogramM2 } from '@/lib/layout/floor-figures';
import { MEASURE_WORDS, questionWords, wristWords } from '@/lib/layout/measure-words';
import { PRINT_PALETTE } from '@/lib/layout/palette';
import { REACH_SHARES, scaleColour, shareOf, type MapScale, type ValueRange } from '@/lib/layout/scales';
import { VERDICT_BANDS } from '@/lib/layout/verdict-words';
import { scaleBarMm, PT_PER_MM, type Box, type PlanFrame } from '../paper';
import { fitted, rectangle, segment, wrapped, type Pen } from '../pen/pen';
import type { ReportSheet } from '../report-sheet';
import { BAND_NAMES } from './band-colour';
import { drawMark } from './plan-lines';

const { ink, inkSoft, red, hair } = PRINT_PALETTE;
const BARS = 24;
/** A PDF takes colours in digits only. */
const hex = (colour: string): string => rgb(colour).formatHex();

/** The column beside the plan: what the colours say, what the marks say, which robots stand there, and the scale. */
export function drawKey(
  pen: Pen,
  box: Box,
  sheet: ReportSheet,
  range: ValueRange,
  mapScale: MapScale,
  frame: PlanFrame,
): void {
  const column = new Column(pen, box);
  drawMapKey(column, sheet, range, mapScale);
  column.gap(9);
  drawMarks(column, sheet);
  column.gap(9);
  drawRobots(column, sheet, box.y + box.height - 66);
  drawScale(pen, { ...box, y: box.y + box.height - 52, height: 52 }, frame);
}

/** Text and drawings one below another. */
class Column {
  y: number;
  constructor(
    readonly pen: Pen,
    readonly box: Box,
  ) {
    this.y = box.y;
  }

  gap(height: number): void {
    this.y += height;
  }

  head(text: string): void {
    this.y += 9;
    this.pen.text(text, this.box.x, this.y, { size: 8.5, face: 'sans-bold' });
    this.y += 3;
    this.pen.path([segment([this.box.x, this.y], [this.box.x + this.box.width, this.y])], { stroke: ink, width: 0.5 });
  }

  words(text: string, size = 7, colour = inkSoft): void {
    for (const line of wrapped(text, this.box.width, size)) {
      this.y += size * 1.25;
      this.pen.text(line, this.box.x, this.y, { size, colour });
    }
  }
}

const squareMetres = (value: number): string => `${value.toFixed(1)} m²`;

function drawMapKey(column: Column, sheet: ReportSheet, range: ValueRange, mapScale: MapScale): void {
  const { mapSettings } = sheet.snapshot;
  const words = MEASURE_WORDS[mapSettings.measure];
  column.head(words.unit ? `${words.name}, ${words.unit}` : words.name);
  column.words(`${questionWords(mapSettings)}, ${wristWords(mapSettings)}.`);
  const { map, figures, threshold } = sheet;
  if (!map || !figures.floor) {
    column.words('The maps of this sheet were not finished when the report was asked for, so the plan shows none.');
    return;
  }
  const { pen, box } = column;
  if (map.measure === 'reach') {
    column.gap(4);
    for (const [share, text] of [
      [REACH_SHARES.one, 'one robot reaches'],
      [REACH_SHARES.more, 'two robots or more reach'],
    ] as const) {
      pen.path([rectangle(box.x, column.y, 12, 8)], { fill: hex(scaleColour(mapScale, share)) });
      pen.text(text, box.x + 16, column.y + 6.5, { size: 7 });
      column.gap(11);
    }
    return column.words(`${squareMetres(figures.floor.reachedM2)} of floor reached.`, 7, ink);
  }
  drawHistogram(column, map, range, mapScale, threshold);
  column.words(words.plainly);
  const above = figures.floor.atOrAboveM2;
  column.words(
    above === null || threshold === null
      ? `${squareMetres(figures.floor.reachedM2)} of floor reached.`
      : `${squareMetres(above)} of ${squareMetres(figures.floor.reachedM2)} of reached floor at or above ` +
          `${threshold.toFixed(words.decimals)}; the rest is hatched.`,
    7,
    ink,
  );
}

/** Floor area by value: the bar over each colour is as long as that much floor. */
function drawHistogram(
  column: Column,
  map: NonNullable<ReportSheet['map']>,
  range: ValueRange,
  mapScale: MapScale,
  threshold: number | null,
): void {
  const { pen, box } = column;
  const edges = Array.from({ length: BARS + 1 }, (_, index) => range.from + (index / BARS) * (range.to - range.from));
  const areas = floorHistogramM2(map, edges);
  const most = Math.max(...areas, 1e-9);
  const height = 34;
  const base = column.y + height + 5;
  const width = box.width / BARS;
  areas.forEach((area, index) => {
    const tall = (area / most) * height;
    const colour = hex(scaleColour(mapScale, (index + 0.5) / BARS));
    if (tall > 0) pen.path([rectangle(box.x + index * width, base - tall, width, tall)], { fill: colour });
    pen.path([rectangle(box.x + index * width, base + 1.5, width + 0.2, 4)], { fill: colour });
  });
  if (threshold !== null) {
    const x = box.x + Math.min(1, Math.max(0, shareOf(range, threshold))) * box.width;
    pen.path([segment([x, base - height], [x, base + 5.5])], { stroke: red, width: 0.8 });
  }
  const { decimals } = MEASURE_WORDS[map.measure];
  pen.text(range.from.toFixed(decimals), box.x, base + 12.5, { size: 6, face: 'mono' });
  pen.text(range.to.toFixed(decimals), box.x + box.width, base + 12.5, { size: 6, face: 'mono', align: 'right' });
  column.y = base + 13;
}

function drawMarks(column: Column, { verdicts }: ReportSheet): void {
  if (verdicts.length === 0) return;
  const { pen, box } = column;
  column.head('Task points');
  column.gap(3);
  for (const band of VERDICT_BANDS) {
    const count = verdicts.filter(({ best }) => (best?.band ?? 'out') === band).length;
    column.gap(9);
    drawMark(pen, [box.x + 4, column.y - 2.3], 3, band);
    pen.text(BAND_NAMES[band], box.x + 12, column.y, { size: 7 });
    pen.text(String(count), box.x + box.width, column.y, { size: 6.5, face: 'mono', align: 'right' });
  }
  const met = verdicts.filter(({ best }) => best?.met).length;
  column.gap(2);
  column.words(`${met} of ${verdicts.length} met. The small figures are the rows of the verdict table.`, 7, ink);
}

function drawRobots(column: Column, { snapshot }: ReportSheet, lowest: number): void {
  const robots = snapshot.items.flatMap((item) => (item.kind === 'robot' ? [item] : []));
  if (robots.length === 0) return;
  const { pen, box } = column;
  column.head('Robots');
  column.gap(2);
  const room = Math.max(0, Math.floor((lowest - column.y) / 9) - 1);
  robots.slice(0, room).forEach((robot) => {
    const arm = snapshot.arms.find(({ id }) => id === robot.armId);
    column.gap(9);
    pen.text(robot.name, box.x, column.y, { size: 7, face: 'sans-bold' });
    const armName = fitted(arm?.name ?? 'Arm not known', box.width - 22, 7);
    pen.text(armName, box.x + 22, column.y, { size: 7, colour: inkSoft });
  });
  if (robots.length > room) column.words(`and ${robots.length - room} more, see the assumptions`);
}

/** A bar of a round length on the floor, with its length on paper said in words. */
function drawScale(pen: Pen, box: Box, { scale, ptPerMm }: PlanFrame): void {
  const lengthMm = scaleBarMm(scale, box.width - 4);
  const width = lengthMm * ptPerMm;
  const y = box.y + 24;
  pen.path([segment([box.x, box.y], [box.x + box.width, box.y])], { stroke: hair, width: 0.8 });
  pen.text(`Scale 1:${scale}`, box.x, box.y + 13, { size: 10, face: 'sans-bold' });
  // Two fields, ink and paper, within one outline: its outer edges are exactly the length.
  pen.path([rectangle(box.x, y, width, 4)], { fill: '#ffffff' });
  pen.path([rectangle(box.x, y, width / 2, 4)], { fill: ink });
  pen.path([rectangle(box.x + 0.2, y + 0.2, width - 0.4, 3.6)], { stroke: ink, width: 0.4 });
  const text = lengthMm >= 1000 ? `${lengthMm / 1000} m` : `${lengthMm} mm`;
  pen.text('0', box.x, y + 11, { size: 6.5, face: 'mono' });
  pen.text(text, box.x + width, y + 11, { size: 6.5, face: 'mono', align: 'right' });
  const paper = Number((width / PT_PER_MM).toFixed(2));
  pen.text(`The bar is ${paper} mm long when printed at 100 %.`, box.x, y + 20, { size: 6.5, colour: inkSoft });
}
