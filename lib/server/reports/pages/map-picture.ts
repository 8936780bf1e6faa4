import sharp from 'sharp';
import type { FloorMap } from '@/lib/layout/floor-map';
import { REACH_SHARES, scaleTable, TABLE_SIZE, type MapScale, type ValueRange } from '@/lib/layout/scales';
import type { Picture } from '../pen/pen';

/** Cells are enlarged to about so many pixels a side of the map, or viewers would blur one into the next. */
const WANTED_PX = 1800;

/** The map as a picture, one square a cell, its first row of pixels the farthest row of cells; clear where not reached. */
export async function mapPicture(map: FloorMap, scale: MapScale, range: ValueRange): Promise<Picture> {
  const { columns, rows } = map.grid;
  const table = scaleTable(scale);
  const last = TABLE_SIZE - 1;
  const pixels = new Uint32Array(columns * rows);
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      const cell = row * columns + column;
      pixels[(rows - 1 - row) * columns + column] = colourOf(map, cell, range, table, last);
    }
  }
  const factor = Math.max(1, Math.min(8, Math.round(WANTED_PX / Math.max(columns, rows))));
  const { data, info } = await sharp(Buffer.from(pixels.buffer), { raw: { width: columns, height: rows, channels: 4 } })
    .resize({ width: columns * factor, height: rows * factor, kernel: 'nearest', fit: 'fill' })
    .png({ compressionLevel: 9 })
    .toBuffer({ resolveWithObject: true });
  return { bytes: data, mediaType: 'image/png', widthPx: info.width, heightPx: info.height };
}

function colourOf(map: FloorMap, cell: number, range: ValueRange, table: Uint32Array, last: number): number {
  if (map.measure === 'reach') {
    const count = map.reachedBy[cell];
    if (count === 0) return 0;
    return table[Math.round((count === 1 ? REACH_SHARES.one : REACH_SHARES.more) * last)];
  }
  const value = map.value[cell];
  if (Number.isNaN(value)) return 0;
  const share = (value - range.from) / (range.to - range.from || 1);
  return table[Math.round(Math.min(1, Math.max(0, share)) * last)];
}
