import { itemToFloor, type PointMm } from './geometry';
import type { Item } from './items';
import type { Palette } from './palette';
import { boundsOfPoints } from './viewport';

/** Size of the picture, px. */
export interface ThumbnailSize {
  readonly widthPx: number;
  readonly heightPx: number;
}

const MARGIN_PX = 6;
/** A base is drawn this large at least, so that it is seen among bodies. */
const BASE_RADIUS_MM = 210;
/** A single small thing does not fill the picture, mm. */
const LEAST_SIDE_MM = 2000;

type Look = { readonly stroke: string; readonly fill: string; readonly width: number; readonly dash?: string };
type Mark =
  | { readonly points: PointMm[]; readonly closed: boolean; readonly look: Look }
  | { readonly centre: PointMm; readonly radiusMm: number; readonly look: Look };

/** The linework of a layout as a small SVG: what stands where, without lettering. An empty layout is a bare sheet. */
export function thumbnailSvg(items: readonly Item[], palette: Palette, { widthPx, heightPx }: ThumbnailSize): string {
  const marks = items.filter(({ hidden }) => !hidden).flatMap((item) => marksOf(item, palette));
  const bounds = boundsOfPoints(marks.flatMap(extentOf));
  const open = `<svg xmlns="http://www.w3.org/2000/svg" width="${widthPx}" height="${heightPx}">`;
  const ground = `<rect width="100%" height="100%" fill="${palette.sheet}"/>`;
  if (!bounds) return `${open}${ground}</svg>`;
  const width = Math.max(LEAST_SIDE_MM, bounds.maxXMm - bounds.minXMm);
  const height = Math.max(LEAST_SIDE_MM, bounds.maxYMm - bounds.minYMm);
  const scale = Math.min((widthPx - 2 * MARGIN_PX) / width, (heightPx - 2 * MARGIN_PX) / height);
  const [middleX, middleY] = [(bounds.minXMm + bounds.maxXMm) / 2, (bounds.minYMm + bounds.maxYMm) / 2];
  // The floor's y runs away, the picture's runs down.
  const place = ([x, y]: PointMm): string =>
    `${round(widthPx / 2 + (x - middleX) * scale)} ${round(heightPx / 2 - (y - middleY) * scale)}`;
  return `${open}${ground}${marks.map((mark) => drawn(mark, place, scale)).join('')}</svg>`;
}

const round = (value: number): number => Math.round(value * 100) / 100;

function drawn(mark: Mark, place: (point: PointMm) => string, scale: number): string {
  const { stroke, fill, width, dash } = mark.look;
  const ink = `stroke="${stroke}" fill="${fill}" stroke-width="${width}"${dash ? ` stroke-dasharray="${dash}"` : ''}`;
  if ('centre' in mark) {
    const [x, y] = place(mark.centre).split(' ');
    return `<circle cx="${x}" cy="${y}" r="${round(Math.max(2.5, mark.radiusMm * scale))}" ${ink}/>`;
  }
  return `<path d="M${mark.points.map(place).join('L')}${mark.closed ? 'Z' : ''}" ${ink}/>`;
}

function extentOf(mark: Mark): PointMm[] {
  if ('points' in mark) return mark.points;
  const { centre, radiusMm } = mark;
  return [
    [centre[0] - radiusMm, centre[1] - radiusMm],
    [centre[0] + radiusMm, centre[1] + radiusMm],
  ];
}

function marksOf(item: Item, palette: Palette): Mark[] {
  const path = (points: readonly PointMm[], closed: boolean, look: Look): Mark[] => [
    { points: points.map((point) => itemToFloor(item, point)), closed, look },
  ];
  const line = (stroke: string, more: Partial<Look> = {}): Look => ({ stroke, fill: 'none', width: 1, ...more });
  switch (item.kind) {
    case 'robot':
      return [
        {
          centre: [item.xMm, item.yMm],
          radiusMm: BASE_RADIUS_MM,
          look: line(palette.ink, { fill: palette.sheet, width: 1.5 }),
        },
        ...path(
          [
            [0, 0],
            [BASE_RADIUS_MM * 2, 0],
          ],
          false,
          line(palette.ink, { width: 1.5 }),
        ),
      ];
    case 'fixture':
      return path(item.outlineMm, true, line(palette.ink, { fill: palette.sheet }));
    case 'obstacle':
      return path(item.outlineMm, true, line(palette.inkSoft, { fill: palette.hair }));
    case 'zone':
      return path(item.outlineMm, true, line(palette.red, { dash: '3 2' }));
    case 'guardLine':
      return path(item.pointsMm, item.closed, line(palette.red, { dash: '1.5 2' }));
    case 'protectiveDevice':
      return path(item.pointsMm, false, line(palette.red));
    case 'conveyor':
      return path(item.pointsMm, false, line(palette.inkSoft, { width: 2.5 }));
    case 'walkway':
      return path(item.pointsMm, false, line(palette.inkSoft, { dash: '6 2 1 2' }));
    // Marks of the drawing, too fine to be seen at this size.
    case 'dimension':
    case 'sectionLine':
    case 'note':
      return [];
  }
}
