/** The two boards a sheet can lie on. Without a choice the device's own preference decides. */
export const BOARDS = ['day', 'night'] as const;
export type Board = (typeof BOARDS)[number];
export type BoardChoice = Board | 'device';

export const BOARD_COOKIE = 'board';

export const isBoard = (value: unknown): value is Board => BOARDS.some((board) => board === value);

const DARK = '(prefers-color-scheme: dark)';

/** Runs before the first paint of a page whose reader has made no choice, so that nobody sees the other board flash. */
export const boardScript = `document.documentElement.dataset.board=matchMedia('${DARK}').matches?'night':'day'`;

/** The reader's choice, as kept in the cookie. */
export function readBoardChoice(): BoardChoice {
  const kept = document.cookie.match(new RegExp(`(?:^|; )${BOARD_COOKIE}=([^;]*)`))?.[1];
  return isBoard(kept) ? kept : 'device';
}

/** Keeps the choice for a year and shows it at once. */
export function chooseBoard(choice: BoardChoice): void {
  const age = choice === 'device' ? 0 : 365 * 24 * 3600;
  document.cookie = `${BOARD_COOKIE}=${choice}; path=/; max-age=${age}; samesite=lax`;
  document.documentElement.dataset.board =
    choice === 'device' ? (window.matchMedia(DARK).matches ? 'night' : 'day') : choice;
}
