/**
 * Single-stroke lettering, as templates draw it: a machine without any fonts can still letter the floor plan. Glyphs stand on a grid of
 * 4 × 6, y up.
 */
const GLYPHS: Record<string, string> = {
  '0': 'M1 0L0 1L0 5L1 6L3 6L4 5L4 1L3 0Z',
  '1': 'M1 5L2 6L2 0',
  '2': 'M0 5L1 6L3 6L4 5L4 4L0 0L4 0',
  '3': 'M0 6L4 6L2 4L3 4L4 3L4 1L3 0L1 0L0 1',
  '4': 'M3 0L3 6L0 2L4 2',
  '5': 'M4 6L0 6L0 4L3 4L4 3L4 1L3 0L0 0',
  '6': 'M4 6L2 6L0 4L0 1L1 0L3 0L4 1L4 2L3 3L0 3',
  '7': 'M0 6L4 6L1 0',
  '8': 'M1 3L0 4L0 5L1 6L3 6L4 5L4 4L3 3L1 3L0 2L0 1L1 0L3 0L4 1L4 2L3 3',
  '9': 'M0 0L2 0L4 2L4 5L3 6L1 6L0 5L0 4L1 3L4 3',
  A: 'M0 0L2 6L4 0M0.67 2L3.33 2',
  B: 'M0 0L0 6L3 6L4 5L4 4L3 3L0 3M3 3L4 2L4 1L3 0L0 0',
  C: 'M4 5L3 6L1 6L0 5L0 1L1 0L3 0L4 1',
  D: 'M0 0L0 6L2 6L4 4L4 2L2 0Z',
  E: 'M4 0L0 0L0 6L4 6M0 3L3 3',
  F: 'M0 0L0 6L4 6M0 3L3 3',
  G: 'M4 5L3 6L1 6L0 5L0 1L1 0L3 0L4 1L4 3L2 3',
  H: 'M0 0L0 6M4 0L4 6M0 3L4 3',
  I: 'M2 0L2 6',
  K: 'M0 0L0 6M4 6L0 2M1 3L4 0',
  L: 'M0 6L0 0L4 0',
  M: 'M0 0L0 6L2 3L4 6L4 0',
  N: 'M0 0L0 6L4 0L4 6',
  O: 'M1 0L0 1L0 5L1 6L3 6L4 5L4 1L3 0Z',
  P: 'M0 0L0 6L3 6L4 5L4 4L3 3L0 3',
  Q: 'M1 0L0 1L0 5L1 6L3 6L4 5L4 1L3 0ZM2 2L4 0',
  R: 'M0 0L0 6L3 6L4 5L4 4L3 3L0 3M2 3L4 0',
  S: 'M4 5L3 6L1 6L0 5L0 4L1 3L3 3L4 2L4 1L3 0L1 0L0 1',
  T: 'M0 6L4 6M2 6L2 0',
  U: 'M0 6L0 1L1 0L3 0L4 1L4 6',
  V: 'M0 6L2 0L4 6',
  X: 'M0 0L4 6M0 6L4 0',
  Y: 'M0 6L2 3L4 6M2 3L2 0',
  ',': 'M1 1L0 -1',
};

const ADVANCE = 6;
const HEIGHT = 6;

/** Width of a line of text, mm. */
export const textWidthMm = (text: string, heightMm: number): number =>
  ((text.length * ADVANCE - 2) * heightMm) / HEIGHT;

/**
 * A line of capitals as SVG, its lower left corner at the point given (mm, floor frame; the picture's y axis points down).
 * `turnedDeg` is counter-clockwise.
 */
export function lettering(text: string, xMm: number, yMm: number, heightMm: number, turnedDeg = 0): string {
  const scale = heightMm / HEIGHT;
  const glyphs = [...text.toUpperCase()].map(
    (letter, index) => `<path d="${GLYPHS[letter] ?? ''}" transform="translate(${index * ADVANCE} 0)"/>`,
  );
  return (
    `<g transform="translate(${xMm} ${-yMm}) rotate(${-turnedDeg}) scale(${scale} ${-scale})" ` +
    `fill="none" stroke="#3b4650" stroke-width="0.7" stroke-linecap="round" stroke-linejoin="round">${glyphs.join('')}</g>`
  );
}
