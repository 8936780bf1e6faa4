import { refuse } from './imported-arm';

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i;
/** Longer than any arm and any angle; keeps squares far from overflow. */
const LARGEST = 1e6;

/** Three numbers with blanks between them. Throws Refused. */
export function readTriple(text: string, where: string): [number, number, number] {
  const [x, y, z] = wordsOf(text, where).map(Number);
  return [x, y, z];
}

function wordsOf(text: string, where: string): string[] {
  const words = text.split(/\s+/);
  const bad = words.find((word) => !NUMBER.test(word) || Math.abs(Number(word)) > LARGEST);
  if (bad !== undefined || words.length !== 3)
    refuse(
      bad === undefined ? 'Three numbers are due here.' : `“${bad.slice(0, 40)}” is no number that can be used here.`,
      where,
    );
  return words;
}

/** Angles that are written out in decimals, with the fewest decimals at which the writing is taken for a rounded one. */
const EXACT = [
  { step: Math.PI / 2, decimals: 2 },
  { step: Math.PI / 4, decimals: 3 },
] as const;

/**
 * Three angles (rad), where 1.5708 is a right angle: decimals that are exactly what a right or a half right angle rounds or is
 * cut to mean that angle. Else axes that were meant parallel would meet a hundred kilometres away.
 */
export function squareAngles(text: string, where: string): { angles: [number, number, number]; squared: number } {
  let squared = 0;
  const [x, y, z] = wordsOf(text, where).map((word) => {
    const value = Number(word);
    const exact = exactOf(word, value);
    if (exact !== value) squared += 1;
    return exact;
  });
  return { angles: [x, y, z], squared };
}

function exactOf(word: string, value: number): number {
  if (value === 0 || /e/i.test(word)) return snapped(value);
  const decimals = word.split('.')[1]?.length ?? 0;
  for (const { step, decimals: fewest } of EXACT) {
    const exact = Math.round(value / step) * step;
    if (exact === 0 || decimals < fewest) continue;
    const unit = 10 ** -decimals;
    const cut = Math.trunc(exact / unit) * unit;
    const rounded = Math.round(exact / unit) * unit;
    if ([cut, rounded].some((each) => Math.abs(each - value) < unit * 1e-3)) return exact;
  }
  return snapped(value);
}

/** Full precision, last digits apart. */
function snapped(value: number): number {
  const exact = Math.round(value / (Math.PI / 4)) * (Math.PI / 4);
  return Math.abs(exact - value) < 1e-12 ? exact : value;
}
