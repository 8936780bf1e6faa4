import { type Circle, type Layer, type Line, type Shape, type Spot, type Words } from '@/lib/layout/export/linework';
import { PRINT_PALETTE } from '@/lib/layout/palette';
import { robotSizes } from '@/lib/layout/robot-sticks';
import type { PointVerdict } from '@/lib/layout/verdicts';
import type { PlanFrame } from '../paper';
import { textWidth, type Face } from '../pen/fonts';
import { rectangle, segment, type PathStyle, type Pen, type Ring, type XY } from '../pen/pen';
import { bandColour } from './band-colour';

const { ink, inkSoft, red, petrol, sheet, hair } = PRINT_PALETTE;

const BODY: Partial<Record<Layer, PathStyle>> = {
  OBSTACLES: { stroke: inkSoft, width: 0.8, fill: hair, fillOpacity: 0.75 },
  CONVEYORS: { stroke: ink, width: 0.7, fill: sheet, fillOpacity: 0.7 },
  FIXTURES: { stroke: ink, width: 0.9, fill: sheet, fillOpacity: 0.75 },
  'GUARD-LINES': { stroke: red, width: 1.3, dash: [0.01, 2.6], round: true },
  'PROTECTIVE-DEVICES': { stroke: red, width: 1.1 },
  ZONES: { stroke: petrol, width: 0.7, dash: [5, 2, 1, 2] },
  ROBOTS: { stroke: ink, width: 0.9, fill: sheet },
};
const DETAIL: Partial<Record<Layer, PathStyle>> = {
  WALKWAYS: { stroke: inkSoft, width: 0.6, dash: [7, 2, 1, 2] },
  REACH: { stroke: inkSoft, width: 0.4, dash: [1.5, 2.5] },
  DIMENSIONS: { stroke: ink, width: 0.45 },
  SECTIONS: { stroke: ink, width: 0.9, dash: [9, 2, 2, 2] },
  'GUARD-LINES': { stroke: red, width: 0.7 },
  ROBOTS: { stroke: ink, width: 1.1 },
};
const FINE: PathStyle = { stroke: ink, strokeOpacity: 0.55, width: 0.4 };

/** The linework with its names, over whatever lies on the ground. */
export function drawLines(
  pen: Pen,
  frame: PlanFrame,
  shapes: readonly Shape[],
  verdicts: readonly PointVerdict[],
  reachOf: ReadonlyMap<string, number>,
): void {
  for (const shape of shapes) {
    if (shape.kind === 'line') drawLine(pen, frame, shape, reachOf.get(shape.itemId) ?? 0);
    else if (shape.kind === 'circle') drawCircle(pen, frame, shape);
  }
  const taken: Taken[] = [];
  for (const shape of shapes) {
    if (shape.kind !== 'circle' || shape.layer !== 'ROBOTS') continue;
    const [[x, y], r] = [frame.toPage(shape.centre), shape.radiusMm * frame.ptPerMm];
    taken.push({ x: x - r, y: y - r, width: 2 * r, height: 2 * r });
  }
  for (const shape of shapes) if (shape.kind === 'spot') drawSpot(pen, frame, shape, verdicts, taken);
  for (const shape of shapes) if (shape.kind === 'words') drawWords(pen, frame, shape, taken);
}

function drawLine(pen: Pen, frame: PlanFrame, line: Line, reachMm: number): void {
  const ring: Ring = { points: line.points.map(frame.toPage), closed: line.closed };
  if (line.part === 'link') {
    const width = Math.max(2, robotSizes(reachMm).linkWidthMm * frame.ptPerMm);
    // The same round-ended line twice, ink and then paper, leaves an outline without computing one.
    pen.path([ring], { stroke: ink, width: width + 0.9, round: true });
    return pen.path([ring], { stroke: sheet, width: width - 0.9, round: true });
  }
  if (line.part === 'arrow' && line.layer === 'DIMENSIONS') {
    return pen.path([{ ...ring, closed: true }], { fill: ink });
  }
  pen.path([ring], (line.part === 'body' ? BODY : DETAIL)[line.layer] ?? FINE);
}

function drawCircle(pen: Pen, frame: PlanFrame, circle: Circle): void {
  const ring = circleRing(frame.toPage(circle.centre), circle.radiusMm * frame.ptPerMm);
  pen.path([ring], (circle.part === 'body' ? BODY : DETAIL)[circle.layer] ?? FINE);
}

/** A circle is flattened to this many sides; at the size of a page nobody sees them. */
const CIRCLE_SIDES = 96;

export function circleRing([x, y]: XY, radius: number): Ring {
  const points = Array.from({ length: CIRCLE_SIDES }, (_, index): XY => {
    const angle = (index / CIRCLE_SIDES) * 2 * Math.PI;
    return [x + radius * Math.cos(angle), y + radius * Math.sin(angle)];
  });
  return { points, closed: true };
}

/** A diamond in the verdict's colour, as on the sheet; what is out of reach is crossed, so that nothing rests on colour alone. */
export function drawMark(pen: Pen, [x, y]: XY, half: number, band: string | undefined): void {
  const ring: Ring = { closed: true, points: [[x, y - half], [x + half, y], [x, y + half], [x - half, y]] }; // prettier-ignore
  pen.path([ring], { fill: bandColour(band), stroke: sheet, width: 0.6 });
  const arm = half * 0.45;
  if (band === 'out' || band === 'pinned')
    pen.path([segment([x - arm, y], [x + arm, y])], { stroke: sheet, width: 0.7 });
  if (band === 'out') pen.path([segment([x, y - arm], [x, y + arm])], { stroke: sheet, width: 0.7 });
}

interface Taken {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

const meets = (a: Taken, b: Taken): boolean =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;

function drawSpot(pen: Pen, frame: PlanFrame, spot: Spot, verdicts: readonly PointVerdict[], taken: Taken[]): void {
  const at = frame.toPage([spot.at[0], spot.at[1]]);
  const index = verdicts.findIndex(({ pointId }) => pointId === spot.pointId);
  drawMark(pen, at, 2.9, verdicts[index]?.best?.band);
  taken.push({ x: at[0] - 3, y: at[1] - 3, width: 6, height: 6 });
  if (index >= 0) place(pen, String(index + 1), [at], { size: 5.5, face: 'mono-medium', gap: 4.2 }, taken);
}

/** Places round an anchor, the wanted one first. */
function place(
  pen: Pen,
  text: string,
  anchors: readonly XY[],
  { size, face, gap, colour }: { size: number; face: Face; gap: number; colour?: string },
  taken: Taken[],
): void {
  const [width, height] = [textWidth(text, face, size) + 2, size * 1.12];
  const [x, y] = anchors[0];
  const tries: XY[] = [
    [x - width / 2, y + gap],
    [x - width / 2, y - gap - height],
    [x + gap, y - height / 2],
    [x - gap - width, y - height / 2],
    [x - width / 2, y + gap + height],
  ];
  const boxes = tries.map(([left, top]): Taken => ({ x: left, y: top, width, height }));
  const free = boxes.find((box) => !taken.some((other) => meets(box, other))) ?? boxes[0];
  taken.push(free);
  pen.path([rectangle(free.x, free.y, free.width, free.height)], { fill: sheet, fillOpacity: 0.72 });
  pen.text(text, free.x + 1, free.y + height * 0.8, { face, size, colour });
}

function drawWords(pen: Pen, frame: PlanFrame, words: Words, taken: Taken[]): void {
  const at = frame.toPage(words.at);
  if (words.layer === 'NOTES') {
    const size = Math.max(4, (words.heightMm ?? 150) * frame.ptPerMm * 1.38);
    return pen.text(words.text, at[0], at[1], { size, angleDeg: words.angleDeg });
  }
  if (words.layer === 'SECTIONS')
    return pen.text(words.text, at[0], at[1] - 4, { size: 9, face: 'sans-bold', align: 'center' });
  if (words.layer === 'DIMENSIONS' || words.of === 'walkway') {
    const face = words.layer === 'DIMENSIONS' ? 'mono' : 'sans';
    const turn = (words.angleDeg * Math.PI) / 180;
    const off = words.layer === 'DIMENSIONS' ? 2 : -2;
    const [x, y] = [at[0] - off * Math.sin(turn), at[1] - off * Math.cos(turn)];
    return pen.text(words.text, x, y, {
      size: 6.5,
      face,
      align: 'center',
      angleDeg: words.angleDeg,
      colour: words.of === 'walkway' ? inkSoft : ink,
    });
  }
  if (words.of === 'guardLine') {
    return pen.text(words.text, at[0] + 2, at[1] - 4, { size: 7, colour: red });
  }
  const bold = words.of === 'robot' || words.of === 'fixture';
  const colour = words.of === 'protectiveDevice' ? red : bold ? ink : inkSoft;
  place(pen, words.text, [at], { size: 7, face: bold ? 'sans-bold' : 'sans', gap: 2, colour }, taken);
}
