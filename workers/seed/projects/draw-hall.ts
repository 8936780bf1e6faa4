import sharp from 'sharp';
import type { CalibrationRequest } from '@/lib/layout/calibration';
import { lettering, textWidthMm } from './lettering';

/** An invented hall in the floor frame, mm: x right, y away. The walls' inner faces are at the four sides named. */
export interface Hall {
  readonly left: number;
  readonly right: number;
  readonly near: number;
  readonly far: number;
  /** Far edge of the aisle along the near wall. */
  readonly aisle: number;
  /** Left jamb and width of the door in the near wall. */
  readonly door: { readonly x: number; readonly width: number };
  readonly title: string;
}

const WALL_MM = 120;
const COLUMN_MM = 260;
const MARGIN_MM = 1000;
const MM_PER_PX = 4;
const INK = '#3b4650';
const WALL_INK = '#7a8591';

const line = (x1: number, y1: number, x2: number, y2: number, style = ''): string =>
  `<path d="M${x1} ${-y1}L${x2} ${-y2}" stroke="${INK}" stroke-width="10" fill="none" ${style}/>`;

const box = (left: number, near: number, right: number, far: number, style: string): string =>
  `<rect x="${left}" y="${-far}" width="${right - left}" height="${far - near}" ${style}/>`;

function walls({ left, right, near, far, door }: Hall): string {
  const style = `fill="${WALL_INK}"`;
  return [
    box(left - WALL_MM, far, right + WALL_MM, far + WALL_MM, style),
    box(left - WALL_MM, near, left, far, style),
    box(right, near, right + WALL_MM, far, style),
    box(left - WALL_MM, near - WALL_MM, door.x, near, style),
    box(door.x + door.width, near - WALL_MM, right + WALL_MM, near, style),
  ].join('');
}

/** In the corners and in the middle of the far wall, each astride its wall. */
function columns({ left, right, near, far }: Hall): string {
  const middle = (left + right) / 2;
  const style = `fill="#e8e4d9" stroke="${WALL_INK}" stroke-width="14"`;
  return [
    [left, near],
    [right, near],
    [left, far],
    [right, far],
    [middle, far],
  ]
    .map(([x, y]) => box(x - COLUMN_MM / 2, y - COLUMN_MM / 2, x + COLUMN_MM / 2, y + COLUMN_MM / 2, style))
    .join('');
}

/** The leaf stands open into the hall. */
function door({ near, door: { x, width } }: Hall): string {
  const hinge = x + width;
  const swing = `<path d="M${x} ${-near}A${width} ${width} 0 0 1 ${hinge} ${-near - width}" fill="none" stroke="${INK}" stroke-width="10"/>`;
  return line(hinge, near, hinge, near + width) + swing;
}

function dimensions({ left, right, near, far }: Hall): string {
  const below = near - 520;
  const beside = left - 520;
  const across = String(right - left);
  const along = String(far - near);
  return [
    line(left, below, right, below),
    line(left, below - 80, left, below + 80),
    line(right, below - 80, right, below + 80),
    lettering(across, (left + right - textWidthMm(across, 130)) / 2, below + 60, 130),
    line(beside, near, beside, far),
    line(beside - 80, near, beside + 80, near),
    line(beside - 80, far, beside + 80, far),
    lettering(along, beside - 60, (near + far - textWidthMm(along, 130)) / 2, 130, 90),
  ].join('');
}

function aisle({ left, right, near, aisle: edge }: Hall): string {
  const words = `aisle, keep ${edge - near - 150} clear`;
  return (
    line(left, edge, right, edge, 'stroke-dasharray="120 40 20 40"') + lettering(words, left + 180, edge - 250, 110)
  );
}

/** Where the floor's origin lies: a crossed circle, as surveyors mark a datum. */
const datum = (): string =>
  `<circle r="70" fill="none" stroke="${INK}" stroke-width="10"/>${line(-120, 0, 120, 0)}${line(0, -120, 0, 120)}`;

/** The picture of the hall as PNG, and how it is set to scale: on its width, checked on its depth. */
export async function drawHall(
  hall: Hall,
): Promise<{ bytes: Uint8Array<ArrayBuffer>; calibration: CalibrationRequest }> {
  const { left, right, near, far, title } = hall;
  const view = { left: Math.min(0, left) - MARGIN_MM, near: Math.min(0, near) - MARGIN_MM };
  const width = right + MARGIN_MM - view.left;
  const height = far + MARGIN_MM - view.near;
  const svg =
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width / MM_PER_PX}" height="${height / MM_PER_PX}" ` +
    `viewBox="${view.left} ${-far - MARGIN_MM} ${width} ${height}">` +
    `<rect x="${view.left}" y="${-far - MARGIN_MM}" width="${width}" height="${height}" fill="#ffffff"/>` +
    [walls(hall), columns(hall), door(hall), aisle(hall), dimensions(hall), datum()].join('') +
    `${lettering(title, right - textWidthMm(title, 120), near - 1000, 120)}</svg>`;
  const png = await sharp(Buffer.from(svg)).flatten().png().toBuffer();

  const px = (x: number, y: number): [number, number] => [
    (x - view.left) / MM_PER_PX,
    (far + MARGIN_MM - y) / MM_PER_PX,
  ];
  const nearSide = { fromPx: px(left, near), toPx: px(right, near) };
  return {
    bytes: new Uint8Array(png),
    calibration: {
      scale: { ...nearSide, distanceMm: right - left },
      check: { fromPx: px(left, near), toPx: px(left, far), distanceMm: far - near },
      level: nearSide,
      originPx: px(0, 0),
    },
  };
}
