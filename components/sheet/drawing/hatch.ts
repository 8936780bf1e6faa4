import type { Ink } from './ink';

const tiles = new Map<string, HTMLCanvasElement>();
/** Tiles are drawn at twice their size so that lines stay crisp on dense screens. */
const DENSITY = 2;

/** A pattern of 45° hatching whose lines stay `spacingPx` apart on the screen; null without a canvas. */
export function hatchPattern(ink: Ink, colour: string, px: number, spacingPx: number): CanvasPattern | null {
  const key = `${colour} ${spacingPx}`;
  let tile = tiles.get(key);
  if (!tile) {
    const size = spacingPx * DENSITY;
    tile = document.createElement('canvas');
    tile.width = size;
    tile.height = size;
    const draw = tile.getContext('2d');
    if (!draw) return null;
    draw.strokeStyle = colour;
    draw.lineWidth = DENSITY;
    draw.lineCap = 'square';
    // The corners too: a stroke cut off by the tile's edge goes on in its neighbour.
    for (const shift of [-size, 0, size]) {
      draw.moveTo(shift, size);
      draw.lineTo(shift + size, 0);
    }
    draw.stroke();
    tiles.set(key, tile);
  }
  const pattern = ink.createPattern(tile, 'repeat');
  pattern?.setTransform(new DOMMatrix([px / DENSITY, 0, 0, -px / DENSITY, 0, 0]));
  return pattern;
}
