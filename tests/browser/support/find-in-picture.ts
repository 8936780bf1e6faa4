import sharp, { type Sharp } from 'sharp';
import type { Page } from '@playwright/test';

/** Thin lines that are half a pixel off must still look alike, px. */
const BLUR = 2;
/** Half the side of the patch looked for and how far it may be off, screen pixels. */
const HALF = 60;
const SEARCH = 30;

interface Patch {
  readonly side: number;
  readonly values: Uint8Array;
}

async function patchOf(image: Sharp, side: number): Promise<Patch> {
  const { data } = await image
    .resize(side, side, { fit: 'fill' })
    .greyscale()
    .blur(BLUR)
    .raw()
    .toBuffer({ resolveWithObject: true });
  return { side, values: new Uint8Array(data) };
}

/** Normalised cross-correlation of the patch with the place at (left, top) of the wider one; the sign is dropped. */
function likeness(patch: Patch, wide: Patch, left: number, top: number): number {
  const n = patch.side * patch.side;
  let sp = 0,
    sw = 0,
    spp = 0,
    sww = 0,
    spw = 0;
  for (let row = 0; row < patch.side; row++)
    for (let column = 0; column < patch.side; column++) {
      const p = patch.values[row * patch.side + column];
      const w = wide.values[(row + top) * wide.side + column + left];
      sp += p;
      sw += w;
      spp += p * p;
      sww += w * w;
      spw += p * w;
    }
  const spread = Math.sqrt((spp - (sp * sp) / n) * (sww - (sw * sw) / n));
  return spread > 0 ? Math.abs(spw - (sp * sw) / n) / spread : 0;
}

export interface Found {
  readonly x: number;
  readonly y: number;
  readonly likeness: number;
}

/**
 * Where a spot of a picture file really is on the screen, found by looking: the surroundings of `pixel` in the file are searched in a
 * screenshot round `guess`. `zoom`: screen pixels a picture pixel. Knows nothing of how the sheet places its floor plan.
 */
export async function findInPicture(
  page: Page,
  file: string,
  pixel: readonly [number, number],
  guess: { x: number; y: number },
  zoom: number,
): Promise<Found> {
  const half = Math.round(HALF / zoom);
  const upright = sharp(await sharp(file).rotate().png().toBuffer());
  const source = upright.extract({
    left: Math.round(pixel[0]) - half,
    top: Math.round(pixel[1]) - half,
    width: 2 * half + 1,
    height: 2 * half + 1,
  });
  // Rounding to whole picture pixels moves the patch by this much of the screen.
  const patchHalf = half * zoom;
  const patch = await patchOf(source, 2 * Math.round(patchHalf) + 1);
  const reach = Math.round(patchHalf) + SEARCH;
  const left = Math.round(guess.x) - reach;
  const top = Math.round(guess.y) - reach;
  const shot = await page.screenshot({ clip: { x: left, y: top, width: 2 * reach + 1, height: 2 * reach + 1 } });
  const wide = await patchOf(sharp(shot), 2 * reach + 1);
  let best: Found = { x: 0, y: 0, likeness: -1 };
  for (let dy = 0; dy <= 2 * SEARCH; dy++)
    for (let dx = 0; dx <= 2 * SEARCH; dx++) {
      const value = likeness(patch, wide, dx, dy);
      if (value > best.likeness)
        best = { x: Math.round(guess.x) + dx - SEARCH, y: Math.round(guess.y) + dy - SEARCH, likeness: value };
    }
  return best;
}
