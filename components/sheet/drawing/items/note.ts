import type { Note } from '@/lib/layout/items';
import { LINE_PITCH, noteLines, noteSizeMm } from '@/lib/layout/note-lines';
import type { Palette } from '@/lib/layout/palette';
import { letter, type Ink } from '../ink';

/** Height of a capital over the size of its font, in the product's own font. */
const CAPITAL_SHARE = 0.7;
/** Words smaller than this on the screen could not be read, so they are lettered this large, px of capitals. */
const LEAST_CAPITAL_PX = 7.5;

/** How many times larger than on the floor a note is lettered at this zoom, so that it can be read. */
export function noteGrowth(note: Note, px: number): number {
  return Math.max(1, (LEAST_CAPITAL_PX * px) / note.sizeMm);
}

/** The words of a note, hanging below and right of its place. Item frame. */
export function drawNote(ink: Ink, palette: Palette, px: number, note: Note): void {
  const capitalMm = note.sizeMm * noteGrowth(note, px);
  noteLines(note).forEach((text, index) =>
    letter(ink, palette, px, {
      text,
      xMm: 0,
      yMm: -capitalMm * (1 + index * LINE_PITCH),
      sizePx: capitalMm / px / CAPITAL_SHARE,
      align: 'left',
      baseline: 'alphabetic',
      weight: 500,
    }),
  );
}

/** The box of a note as it is lettered at this zoom. */
export function lettersOfNote(note: Note, px: number): { widthMm: number; heightMm: number } {
  const { width, height } = noteSizeMm(note);
  const growth = noteGrowth(note, px);
  return { widthMm: width * growth, heightMm: height * growth };
}
