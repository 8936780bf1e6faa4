/**
 * The colours of the drawing, for the canvas, which cannot read CSS by itself. The page's CSS variables are the source;
 * the values here stand in where there is no page (tests, print) and for variables a page has not set.
 */

export interface Palette {
  readonly board: 'day' | 'night';
  readonly paper: string;
  readonly sheet: string;
  readonly ink: string;
  readonly inkSoft: string;
  readonly hair: string;
  readonly petrol: string;
  readonly red: string;
  readonly amber: string;
  readonly green: string;
  readonly sans: string;
  readonly mono: string;
}

const FONTS = { sans: '"Barlow Semi Condensed", sans-serif', mono: '"Sometype Mono", monospace' };

export const DAY_PALETTE: Palette = {
  board: 'day',
  paper: '#ece7dc',
  sheet: '#faf8f2',
  ink: '#1b2733',
  inkSoft: '#56616b',
  hair: '#e2dccd',
  petrol: '#0e5a63',
  red: '#c23b22',
  amber: '#8a5a00',
  green: '#2f7d4f',
  ...FONTS,
};

export const NIGHT_PALETTE: Palette = {
  board: 'night',
  paper: '#0d1722',
  sheet: '#14202d',
  ink: '#e9e5da',
  inkSoft: '#a3adb5',
  hair: '#2a3948',
  petrol: '#6cc3cb',
  red: '#f08a72',
  amber: '#e0b25a',
  green: '#7cc99a',
  ...FONTS,
};

const VARIABLES = {
  paper: '--paper',
  sheet: '--sheet',
  ink: '--ink',
  inkSoft: '--ink-soft',
  hair: '--hair',
  petrol: '--petrol',
  red: '--red',
  amber: '--amber',
  green: '--green',
} as const;

let kept: Palette | null = null;

/** The palette of the page's present board; read from CSS once a board and the same object until the board changes. */
export function readPalette(root: HTMLElement = document.documentElement): Palette {
  const board = root.dataset.board === 'night' ? 'night' : 'day';
  if (kept?.board === board) return kept;
  const standIn = board === 'night' ? NIGHT_PALETTE : DAY_PALETTE;
  const style = getComputedStyle(root);
  const colours = Object.fromEntries(
    Object.entries(VARIABLES).map(([name, variable]) => [
      name,
      style.getPropertyValue(variable).trim() || standIn[name as keyof typeof VARIABLES],
    ]),
  );
  kept = { ...standIn, ...colours };
  return kept;
}

/** For print and exports, which are always on day paper whatever the reader's board is. */
export const PRINT_PALETTE: Palette = { ...DAY_PALETTE, sheet: '#ffffff' };
