import type { Note } from './items';

/** Line pitch and mean letter width over the height of its capitals, as the sheet letters it (measured on the product's own font). */
export const LINE_PITCH = 1.75;
const LETTER_WIDTH = 0.72;

/** The lines of a note. */
export const noteLines = ({ text }: Pick<Note, 'text'>): string[] => text.split('\n');

/** About how much floor a note covers: it hangs below and right of its place. */
export function noteSizeMm(note: Pick<Note, 'text' | 'sizeMm'>): { width: number; height: number } {
  const lines = noteLines(note);
  const longest = Math.max(...lines.map((line) => line.length), 1);
  return {
    width: longest * note.sizeMm * LETTER_WIDTH,
    height: note.sizeMm * (1 + (lines.length - 1) * LINE_PITCH),
  };
}

/** The box of a note in its own frame. */
export function noteBoxMm(note: Pick<Note, 'text' | 'sizeMm'>): [number, number][] {
  const { width, height } = noteSizeMm(note);
  return [
    [0, -height],
    [width, -height],
    [width, 0],
    [0, 0],
  ];
}
