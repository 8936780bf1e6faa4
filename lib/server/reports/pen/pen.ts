import { textWidth, type Face } from './fonts';

/**
 * What a page is drawn with, whether it becomes a PDF or a picture. Points (1/72 inch), x right, y down from the upper left corner.
 */

export type XY = readonly [number, number];
export interface Ring {
  readonly points: readonly XY[];
  readonly closed: boolean;
}
export interface PathStyle {
  readonly fill?: string;
  readonly fillOpacity?: number;
  readonly stroke?: string;
  readonly strokeOpacity?: number;
  readonly width?: number;
  readonly dash?: readonly number[];
  readonly round?: boolean;
}
export interface TextStyle {
  readonly face?: Face;
  readonly size: number;
  readonly colour?: string;
  readonly align?: 'left' | 'center' | 'right';
  /** Counter-clockwise, about the place of the text. */
  readonly angleDeg?: number;
}
/** Pixel (column, row) to page: x = a·column + c·row + e, y = b·column + d·row + f. */
export type Matrix = readonly [a: number, b: number, c: number, d: number, e: number, f: number];
export interface Picture {
  readonly bytes: Uint8Array;
  readonly mediaType: 'image/png' | 'image/jpeg';
  readonly widthPx: number;
  readonly heightPx: number;
}

export interface Pen {
  path(rings: readonly Ring[], style: PathStyle): void;
  /** `y` is the baseline. */
  text(text: string, x: number, y: number, style: TextStyle): void;
  /** `multiply` lays it on as ink over what is there. */
  picture(picture: Picture, matrix: Matrix, options?: { readonly multiply?: boolean; readonly opacity?: number }): void;
  /** What `draw` draws shows within the rings only (even-odd). */
  within(rings: readonly Ring[], draw: () => void): void;
}

export const rectangle = (x: number, y: number, width: number, height: number): Ring => ({
  closed: true,
  points: [
    [x, y],
    [x + width, y],
    [x + width, y + height],
    [x, y + height],
  ],
});

export const segment = (from: XY, to: XY): Ring => ({ closed: false, points: [from, to] });

/** Lines no wider than `width`; a word that is wider alone is cut. */
export function wrapped(text: string, width: number, size: number, face: Face = 'sans'): string[] {
  const fits = (line: string) => textWidth(line, face, size) <= width;
  return text.split('\n').flatMap((paragraph) => {
    const lines: string[] = [];
    let line = '';
    for (const word of paragraph.split(/\s+/).flatMap((whole) => pieces(whole, fits))) {
      const longer = line ? `${line} ${word}` : word;
      if (fits(longer)) line = longer;
      else {
        if (line) lines.push(line);
        line = word;
      }
    }
    return [...lines, line];
  });
}

function pieces(word: string, fits: (text: string) => boolean): string[] {
  if (fits(word)) return [word];
  const cut: string[] = [];
  let piece = '';
  for (const character of word) {
    if (piece && !fits(piece + character)) {
      cut.push(piece);
      piece = '';
    }
    piece += character;
  }
  return [...cut, piece];
}

/** One line, shortened with an ellipsis where it is too wide. */
export function fitted(text: string, width: number, size: number, face: Face = 'sans'): string {
  if (textWidth(text, face, size) <= width) return text;
  const characters = [...text];
  while (characters.length > 1 && textWidth(`${characters.join('')}…`, face, size) > width) characters.pop();
  return `${characters.join('').trimEnd()}…`;
}
