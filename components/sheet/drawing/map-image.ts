import { CELL_CHANGES, type FloorDifference } from '@/lib/layout/floor-figures';
import type { FloorGrid, FloorMap } from '@/lib/layout/floor-map';
import {
  divergingTable,
  REACH_SHARES,
  scaleTable,
  TABLE_SIZE,
  type MapScale,
  type ValueRange,
} from '@/lib/layout/scales';

/** A canvas with one pixel a cell; `reuse` is painted over where it fits, so that a dragged map allocates nothing. */
function blankImage(grid: FloorGrid, reuse: HTMLCanvasElement | null): HTMLCanvasElement {
  if (reuse && reuse.width === grid.columns && reuse.height === grid.rows) return reuse;
  const canvas = document.createElement('canvas');
  canvas.width = grid.columns;
  canvas.height = grid.rows;
  return canvas;
}

function paint(canvas: HTMLCanvasElement, colourOf: (cell: number) => number): HTMLCanvasElement {
  const ink = canvas.getContext('2d');
  if (!ink) return canvas;
  const image = ink.createImageData(canvas.width, canvas.height);
  const pixels = new Uint32Array(image.data.buffer);
  for (let cell = 0; cell < pixels.length; cell += 1) pixels[cell] = colourOf(cell);
  ink.putImageData(image, 0, 0);
  return canvas;
}

/** Paints map after map on one canvas. The picture is a new object each time, so that what draws it knows it changed. */
export class MapPainter {
  private canvas: HTMLCanvasElement | null = null;

  map(map: FloorMap, scale: MapScale, range: ValueRange): GroundImage {
    this.canvas = mapImage(map, scale, range, this.canvas);
    return { canvas: this.canvas, grid: map.grid };
  }

  difference(difference: FloorDifference, limit: number, board: 'day' | 'night'): GroundImage {
    this.canvas = differenceImage(difference, limit, board, this.canvas);
    return { canvas: this.canvas, grid: difference.grid };
  }
}

/** One pixel a cell. */
export interface GroundImage {
  readonly canvas: HTMLCanvasElement;
  readonly grid: FloorGrid;
}

/** A floor map in colours, clear where not reached. The first row of pixels is the first row of cells. */
function mapImage(
  map: FloorMap,
  scale: MapScale,
  range: ValueRange,
  reuse: HTMLCanvasElement | null,
): HTMLCanvasElement {
  const table = scaleTable(scale);
  const last = TABLE_SIZE - 1;
  const canvas = blankImage(map.grid, reuse);
  const { value, reachedBy } = map;
  if (map.measure === 'reach') {
    const one = table[Math.round(REACH_SHARES.one * last)];
    const more = table[Math.round(REACH_SHARES.more * last)];
    return paint(canvas, (cell) => (reachedBy[cell] === 0 ? 0 : reachedBy[cell] === 1 ? one : more));
  }
  const factor = last / (range.to - range.from || 1);
  return paint(canvas, (cell) => {
    const here = value[cell];
    // Only NaN differs from itself.
    if (here !== here) return 0;
    const index = (here - range.from) * factor;
    return table[index <= 0 ? 0 : index >= last ? last : Math.round(index)];
  });
}

/** What changes: petrol for more, red for less, full colour where a spot is gained or lost, clear where nothing is reached. */
function differenceImage(
  difference: FloorDifference,
  limit: number,
  board: 'day' | 'night',
  reuse: HTMLCanvasElement | null,
): HTMLCanvasElement {
  const table = divergingTable(board);
  const last = TABLE_SIZE - 1;
  const [gained, lost] = [CELL_CHANGES.indexOf('gained'), CELL_CHANGES.indexOf('lost')];
  const { value, change } = difference;
  return paint(blankImage(difference.grid, reuse), (cell) => {
    if (change[cell] === gained) return table[last];
    if (change[cell] === lost) return table[0];
    const here = value[cell];
    if (here !== here) return 0;
    const share = limit > 0 ? here / limit : 0;
    return table[Math.round(((Math.min(1, Math.max(-1, share)) + 1) / 2) * last)];
  });
}
