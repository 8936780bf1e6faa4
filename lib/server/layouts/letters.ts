const ALPHABET = 26;
const CODE_OF_A = 'A'.charCodeAt(0);

const letterAt = (index: number): string =>
  (index < ALPHABET ? '' : String.fromCharCode(CODE_OF_A + Math.floor(index / ALPHABET) - 1)) +
  String.fromCharCode(CODE_OF_A + (index % ALPHABET));

/** A … Z, then AA … ZZ: as many variants as a project can have. */
const LETTERS = Array.from({ length: ALPHABET * (ALPHABET + 1) }, (_, index) => letterAt(index));

/** The letter behind the last one given; null when all are used up. Letters of deleted variants in between stay free. */
export function nextLetter(given: readonly string[]): string | null {
  const last = Math.max(-1, ...given.map((letter) => LETTERS.indexOf(letter)));
  return LETTERS[last + 1] ?? null;
}
