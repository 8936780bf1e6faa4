import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import * as fontkit from 'fontkit';

/** The shipped fonts, embedded in every report, so that it looks and measures the same on any machine. */

export const FACES = ['sans', 'sans-medium', 'sans-bold', 'mono', 'mono-medium'] as const;
export type Face = (typeof FACES)[number];

const FILES: Record<Face, readonly [family: string, weight: number]> = {
  sans: ['barlow-semi-condensed', 400],
  'sans-medium': ['barlow-semi-condensed', 500],
  'sans-bold': ['barlow-semi-condensed', 600],
  mono: ['sometype-mono', 400],
  'mono-medium': ['sometype-mono', 500],
};
/** Each face comes in parts; the first that has a character is taken. */
const PARTS = ['latin', 'latin-ext'] as const;

export interface FontPart {
  /** Unique, for the document that embeds it. */
  readonly name: string;
  readonly bytes: Buffer;
  readonly font: fontkit.Font;
}

const kept = new Map<Face, FontPart[]>();

export function fontParts(face: Face): readonly FontPart[] {
  const known = kept.get(face);
  if (known) return known;
  const [family, weight] = FILES[face];
  const parts = PARTS.map((part): FontPart => {
    const bytes = readFileSync(fontFile(family, `${family}-${part}-${weight}-normal.woff`));
    return { name: `${face}-${part}`, bytes, font: fontkit.create(bytes) };
  });
  kept.set(face, parts);
  return parts;
}

function fontFile(family: string, file: string): string {
  const require = createRequire(join(process.cwd(), 'package.json'));
  return require.resolve(`@fontsource/${family}/files/${file}`);
}

/** What neither part of a face has, in words that it has. */
const STAND_INS: Record<string, string> = { '→': '–', '≥': '>=', '≤': '<=', '≈': '~', '\u2009': ' ', '\u202f': ' ' };

export interface TextRun {
  readonly part: FontPart;
  readonly text: string;
}

/** The text cut where another part of the face is needed; line breaks and control characters become blanks. */
export function textRuns(text: string, face: Face): TextRun[] {
  const parts = fontParts(face);
  const has = (part: FontPart, character: string) => part.font.hasGlyphForCodePoint(character.codePointAt(0) ?? 0);
  const runs: { part: FontPart; text: string }[] = [];
  for (const character of text.normalize('NFC').replace(/\p{Cc}+/gu, ' ')) {
    const part = parts.find((candidate) => has(candidate, character));
    const shown = part ? character : (STAND_INS[character] ?? '?');
    const last = runs[runs.length - 1];
    const chosen = part ?? parts[0];
    if (last?.part === chosen) last.text += shown;
    else runs.push({ part: chosen, text: shown });
  }
  return runs;
}

/** Width in points. */
export function textWidth(text: string, face: Face, size: number): number {
  return textRuns(text, face).reduce(
    (sum, run) => sum + (run.part.font.layout(run.text).advanceWidth / run.part.font.unitsPerEm) * size,
    0,
  );
}
