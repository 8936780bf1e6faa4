/** The part of fontkit that is used here; the package brings no types. */
declare module 'fontkit' {
  export interface Glyph {
    readonly path: { scale(x: number, y?: number): { translate(x: number, y: number): { toSVG(): string } } };
    readonly advanceWidth: number;
  }
  export interface GlyphRun {
    readonly glyphs: readonly Glyph[];
    readonly positions: readonly { readonly xAdvance: number; readonly xOffset: number; readonly yOffset: number }[];
    readonly advanceWidth: number;
  }
  export interface Font {
    readonly unitsPerEm: number;
    hasGlyphForCodePoint(codePoint: number): boolean;
    layout(text: string): GlyphRun;
  }
  export function create(bytes: Uint8Array): Font;
}
