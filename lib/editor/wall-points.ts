/**
 * Corners of the dark lines and walls of a floor plan's picture, to snap to.
 *
 * Where they are: C. Harris and M. Stephens, "A combined corner and edge detector", Alvey Vision Conference 1988. Exactly where: the
 * point nearest to all edge lines about it, W. Förstner and E. Gülch, "A fast operator for detection and precise location of
 * distinct points, corners and centres of circular features", ISPRS 1987.
 */

export interface Luma {
  readonly width: number;
  readonly height: number;
  /** Brightness row by row from the upper left corner, 0 to 255. */
  readonly values: Uint8Array;
}

/** Brightness of the pixels of a canvas (RGBA), on white where they are clear. */
export function lumaOf(rgba: ArrayLike<number>, width: number, height: number): Luma {
  const values = new Uint8Array(width * height);
  for (let index = 0; index < values.length; index += 1) {
    const at = index * 4;
    const alpha = rgba[at + 3] / 255;
    // Weights of ITU-R BT.601.
    const grey = 0.299 * rgba[at] + 0.587 * rgba[at + 1] + 0.114 * rgba[at + 2];
    values[index] = Math.round(grey * alpha + 255 * (1 - alpha));
  }
  return { width, height, values };
}

/** Half the side of the window that a corner is judged by, px. */
const WINDOW = 3;
/** Of two corners nearer than this only the stronger counts, px. */
const APART = 6;
/** Weight of the edge against the corner, from the paper. */
const HARRIS = 0.05;
/** A corner weaker than this part of the strongest is noise or lettering. */
const WEAKEST = 0.04;

/** Corners in pixels from the picture's upper left corner (pixel centres at halves), the most distinct first, at most `limit`. */
export function wallPoints({ width, height, values }: Luma, limit: number): { x: number; y: number }[] {
  const count = width * height;
  const xx = new Float32Array(count);
  const yy = new Float32Array(count);
  const xy = new Float32Array(count);
  for (let row = 1; row < height - 1; row += 1) {
    for (let at = row * width + 1, last = at + width - 2; at < last; at += 1) {
      const byX = (values[at + 1] - values[at - 1]) / 255;
      const byY = (values[at + width] - values[at - width]) / 255;
      xx[at] = byX * byX;
      yy[at] = byY * byY;
      xy[at] = byX * byY;
    }
  }
  const strength = new Float32Array(count);
  const [sumXx, sumYy, sumXy] = [xx, yy, xy].map((plane) => boxSum(plane, width, height));
  let strongest = 0;
  for (let at = 0; at < count; at += 1) {
    const trace = sumXx[at] + sumYy[at];
    const value = sumXx[at] * sumYy[at] - sumXy[at] * sumXy[at] - HARRIS * trace * trace;
    strength[at] = value;
    if (value > strongest) strongest = value;
  }
  const peaks: { at: number; value: number }[] = [];
  const margin = APART + WINDOW;
  for (let row = margin; row < height - margin; row += 1) {
    for (let column = margin; column < width - margin; column += 1) {
      const at = row * width + column;
      if (strength[at] > WEAKEST * strongest && isPeak(strength, at, width)) peaks.push({ at, value: strength[at] });
    }
  }
  peaks.sort((one, other) => other.value - one.value);
  return peaks.slice(0, limit).map(({ at }) => refined({ xx, yy, xy }, at, width));
}

/** Sums over the window about each pixel: along rows, then along columns. */
function boxSum(plane: Float32Array, width: number, height: number): Float32Array {
  const alongRows = new Float32Array(plane.length);
  for (let row = 0; row < height; row += 1) {
    let sum = 0;
    for (let column = 0; column < width + WINDOW; column += 1) {
      if (column < width) sum += plane[row * width + column];
      if (column > 2 * WINDOW) sum -= plane[row * width + column - 2 * WINDOW - 1];
      if (column >= WINDOW) alongRows[row * width + column - WINDOW] = sum;
    }
  }
  const sums = new Float32Array(plane.length);
  for (let column = 0; column < width; column += 1) {
    let sum = 0;
    for (let row = 0; row < height + WINDOW; row += 1) {
      if (row < height) sum += alongRows[row * width + column];
      if (row > 2 * WINDOW) sum -= alongRows[(row - 2 * WINDOW - 1) * width + column];
      if (row >= WINDOW) sums[(row - WINDOW) * width + column] = sum;
    }
  }
  return sums;
}

function isPeak(strength: Float32Array, at: number, width: number): boolean {
  for (let down = -APART; down <= APART; down += 1) {
    for (let right = -APART; right <= APART; right += 1) {
      const other = at + down * width + right;
      // Of equals the first counts.
      if (strength[other] > strength[at] || (strength[other] === strength[at] && other < at)) return false;
    }
  }
  return true;
}

type Gradients = Record<'xx' | 'yy' | 'xy', Float32Array>;

/** The point with the least sum of squared distances to the edges in the window, each weighted by its contrast. */
function refined({ xx, yy, xy }: Gradients, at: number, width: number): { x: number; y: number } {
  let [a, b, c, right, down] = [0, 0, 0, 0, 0];
  for (let dy = -WINDOW; dy <= WINDOW; dy += 1) {
    for (let dx = -WINDOW; dx <= WINDOW; dx += 1) {
      const here = at + dy * width + dx;
      a += xx[here];
      b += xy[here];
      c += yy[here];
      right += xx[here] * dx + xy[here] * dy;
      down += xy[here] * dx + yy[here] * dy;
    }
  }
  const column = at % width;
  const row = (at - column) / width;
  const determinant = a * c - b * b;
  const byX = (c * right - b * down) / determinant;
  const byY = (a * down - b * right) / determinant;
  const isNear = Math.abs(byX) <= WINDOW && Math.abs(byY) <= WINDOW;
  return isNear ? { x: column + 0.5 + byX, y: row + 0.5 + byY } : { x: column + 0.5, y: row + 0.5 };
}
